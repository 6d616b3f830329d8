import { useMemo } from "react";
import { stackDraft, type StackChoices, type StackDraft } from "#app/lib/stack-draft.ts";
import { stackText } from "#app/lib/stack-text.ts";

/** The stack that a form's text says, the very same object for as long as it says the same. `said` is that text as JSON. */
export function useStackDraft(said: string, choices: StackChoices): StackDraft {
  return useMemo(() => stackDraft(stackText(JSON.parse(said)), choices), [said, choices]);
}
