import { useDeferredValue, useMemo } from "react";
import { stackDraft, type StackChoices, type StackDraft } from "#app/lib/stack-draft.ts";
import { stackText } from "#app/lib/stack-text.ts";

/** What decides which films there are, and where. */
const order = (said: string) =>
  stackText(JSON.parse(said))
    .layers.map(({ side, film }) => `${side} ${film}`)
    .join();

/**
 * The stack that a form's text says, the very same object for as long as it says the same. While a field is typed into, the draft may
 * lag behind its text, in pieces that the next key goes before; never about which films there are: a film that the draft did not know
 * would lose its fields.
 * @param said that text as JSON
 */
export function useStackDraft(said: string, choices: StackChoices, typing: boolean): StackDraft {
  const followed = useDeferredValue(said);
  const late = typing && followed !== said && order(followed) === order(said);
  const read = late ? followed : said;
  return useMemo(() => stackDraft(stackText(JSON.parse(read)), choices), [read, choices]);
}
