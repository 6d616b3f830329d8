import { useDeferredValue, useMemo } from "react";
import { stackDraft, type StackChoices, type StackDraft } from "#app/lib/stack-draft.ts";
import { stackText } from "#app/lib/stack-text.ts";

/** What decides which films there are, and where. */
const order = (said: string) =>
  stackText(JSON.parse(said))
    .layers.map(({ side, film }) => `${side} ${film}`)
    .join();

/** What the draft is read from, as JSON: a name, a note or a program changes no figure and no drawing. */
const readFrom = (said: string) => JSON.stringify({ ...stackText(JSON.parse(said)), name: "", note: "", program: "" });

/**
 * The stack that a form's text says, the very same object for as long as it says the same of silicon and films. While a field is typed into, the draft may
 * lag behind its text, in pieces that the next key goes before; never about which films there are: a film that the draft did not know
 * would lose its fields.
 * @param text that text as JSON
 */
export function useStackDraft(text: string, choices: StackChoices, typing: boolean): StackDraft {
  const said = useMemo(() => readFrom(text), [text]);
  const followed = useDeferredValue(said);
  const late = typing && followed !== said && order(followed) === order(said);
  const read = late ? followed : said;
  return useMemo(() => stackDraft(stackText(JSON.parse(read)), choices), [read, choices]);
}
