import { inOwnUnits } from "#app/lib/own-units.ts";
import { useOwnUnits } from "./own-units-context.ts";

/** A text whose figures stand in the reader's own units. Put around texts by `own-jsx`, so it is not written by hand. */
export function OwnText({ text }: { text: string }) {
  return inOwnUnits(text, useOwnUnits());
}
