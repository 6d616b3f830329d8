import { z } from "zod";
import { wholeNumber } from "./record-fields.ts";

/** A piece of a kind of carrier as its form gives it. */
export const carrierUnitSchema = z.object({
  mark: z.string("Type its mark.").trim().min(1, "Type its mark.").max(60, "Keep the mark under 60 characters."),
  uses: wholeNumber("Type how often it was used, as a whole number; 0 for a new one.", { least: 0, most: 10_000 }),
});
export type CarrierUnitValues = z.output<typeof carrierUnitSchema>;
