import { z } from "zod";
import { measuredDay, reason } from "./accept-form.ts";
import { optionalQuantity, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { line } from "./record-fields.ts";

/** A stress that was measured elsewhere and is typed into a film's history. `uncertainty` is the expanded one, k = 2. */
export const typedStressSchema = z.object({
  value: quantity(RULES.stress),
  uncertainty: quantity({
    label: "uncertainty",
    dimension: "stress",
    range: { least: 1e3, most: 1e10, words: "1 kPa to 10 GPa" },
  }),
  filmThickness: optionalQuantity(RULES.filmThickness),
  instrument: line(80),
  measuredAt: measuredDay,
  source: reason("Say where the value comes from: a report, a tool, a person."),
  reason: reason("Say why this value may stand for the film."),
});
export type TypedStress = z.output<typeof typedStressSchema>;

/** Why a value is set aside. */
export const setAsideSchema = z.object({ reason: reason("Say why this value does not count.") });
