import type { FieldName, FormMetadata } from "@conform-to/react";
import { filmOf, putBack } from "#app/lib/stack-put-back.ts";
import type { StackText } from "#app/lib/stack-text.ts";
import { focusField, LAYERS } from "./stack-fields.ts";
import type { useSelectedLayer } from "./use-selected-layer.ts";

/** Keys of films are made anew when they come, go, or are written as a whole; a single field of one leaves its key. */
const WITHIN_FILM = /^layers\[\d+\]\../;

/** Puts another state of the stack into the form, opens the film that it is about and, if asked, takes the focus to what has changed. */
export function putInto(
  form: FormMetadata<StackText>,
  [from, to]: [StackText, StackText],
  { select, expect }: ReturnType<typeof useSelectedLayer>,
  focus: boolean,
): void {
  const change = putBack(from, to);
  if (!change) return;
  const film = filmOf(change.field);
  if (change.kind === "update" && WITHIN_FILM.test(change.name ?? "")) select(film ?? "silicon");
  else if (film !== null) expect(film);
  if (change.kind === "insert") form.insert({ name: LAYERS, index: change.index, defaultValue: change.value });
  else if (change.kind === "remove") form.remove({ name: LAYERS, index: change.index });
  else form.update({ name: change.name as FieldName<unknown>, value: change.value as never });
  // The film opens with the next paint; a field in a folded part can't take the focus before.
  if (focus) requestAnimationFrame(() => focusField(change.field));
}
