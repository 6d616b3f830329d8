import type { ReactNode } from "react";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { inOwnUnits } from "#app/lib/own-units.ts";
import { useOwnUnits } from "./own-units-context.ts";

/** A quantity as it was understood, with what it is in the reader's unit beside it: '5 µm = 0.197 mil'. */
export function Understood({ text, dimension }: { text: string; dimension: Dimension }) {
  const units = useOwnUnits();
  // A difference of 5 °C is none of 41 °F.
  const own = dimension === "temperatureDifference" ? text : inOwnUnits(text, units);
  return own === text ? text : `${text} = ${own}`;
}

/** A text that stays as it is: what was typed, and what is wrong with it. */
export function Verbatim({ children }: { children: ReactNode }) {
  return children;
}
