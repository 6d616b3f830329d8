import type { ReactNode } from "react";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { inOwnUnits } from "#app/lib/own-units.ts";
import { useOwnUnits } from "./own-units-context.ts";

/** A quantity as it was understood, with what it is in the reader's unit beside it: '5 µm = 0.197 mil'. */
export function Understood({ text, dimension }: { text: string; dimension: Dimension }) {
  const units = useOwnUnits();
  // In a field an ordinary space stands before the unit. A difference of 5 °C is none of 41 °F.
  const shown = text.replace(/ (?=\S+$)/, "\u00A0");
  const own = dimension === "temperatureDifference" ? shown : inOwnUnits(shown, units);
  return own === shown ? shown : `${shown} = ${own}`;
}

/** A text that stays as it is: what was typed, and what is wrong with it. */
export function Verbatim({ children }: { children: ReactNode }) {
  return children;
}
