import type { StepState } from "../flow/walk.ts";
import { exceeds } from "./against-limit.ts";
import type { Finding } from "./finding.ts";
import { findingsOf } from "./make-finding.ts";
import { micrometres } from "./words.ts";

const make = findingsOf(6, "Bonding material");

/** A bond thinner or thicker than its material is made for, at the step that bonds; exactly at either end is clear. */
export function bondThickness(state: StepState): Finding[] {
  const { bond, kind } = state.step;
  if (kind !== "bond" || !bond) return [];
  const { name, leastThickness, mostThickness } = bond.material;
  const typed = bond.thickness.value;
  const thin = typeof leastThickness === "number" && exceeds(leastThickness, typed);
  const thick = typeof mostThickness === "number" && exceeds(typed, mostThickness);
  if (!thin && !thick) return [];
  const end = thin ? leastThickness : mostThickness;
  if (typeof end !== "number") return [];
  const made = thin ? `from ${micrometres(end)} up` : `up to ${micrometres(end)}`;
  return [
    make(state, "caution", `The bond is ${micrometres(typed)} thick; ${name} is made for bonds ${made}.`, {
      remedy: `Bond it ${made}, or with a material that is made for ${micrometres(typed)}.`,
      figures: [{ label: "Bond thickness", value: typed, unit: "m" }],
      limit: {
        label: `${name}, ${thin ? "thinnest" : "thickest"} bond`,
        value: end,
        unit: "m",
        source: "library, the range it is made for",
      },
    }),
  ];
}
