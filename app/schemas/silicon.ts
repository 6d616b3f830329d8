import { z } from "zod";
import { measured, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

/** Faces that the engine knows. */
export const ORIENTATIONS = ["100", "111"] as const;

export const siliconSchema = z.object({
  ...recordFields,
  orientation: z.enum(ORIENTATIONS, "Choose the face of the wafer."),
  diameter: quantity(RULES.diameter),
  thickness: measured(RULES.siliconThickness),
});
export type SiliconValues = z.output<typeof siliconSchema>;
