import { z } from "zod";
import { STEP_KINDS } from "#app/engine/flow/model.ts";
import { EXPOSURES, HOLDINGS } from "#app/engine/vocabulary.ts";
import { measured, optionalMeasured, optionalQuantity, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

export const flowSchema = z.object({
  ...recordFields,
  program: z.uuid("Choose a program."),
  silicon: z.uuid("Choose the silicon."),
  incomingThickness: measured({ ...RULES.siliconThickness, source: "supplier" }),
});
export type FlowValues = z.output<typeof flowSchema>;

const filmChange = z.object({
  change: z.enum(["adds", "removes"]),
  side: z.enum(["front", "back"]),
  film: z.uuid("Choose a film."),
  thickness: optionalMeasured({ ...RULES.filmThickness, source: "assumed" }),
  stress: optionalMeasured({ ...RULES.stress, source: "assumed" }),
  coverage: optionalQuantity(RULES.coverage),
});

const identifier = z
  .union([z.uuid(), z.literal("")])
  .optional()
  .transform((id) => id || null);

export const stepSchema = z
  .object({
    title: z.string("Say what is done.").trim().min(1, "Say what is done.").max(120, "Keep it under 120 characters."),
    kind: z.enum(STEP_KINDS, "Choose the kind of step."),
    peakTemperature: quantity({ ...RULES.temperature, label: "peak temperature" }),
    holdTime: optionalQuantity(RULES.holdTime),
    equipment: identifier,
    exposures: z
      .array(z.enum(EXPOSURES))
      .optional()
      .transform((list) => list ?? []),
    planned: z.enum(HOLDINGS, "Choose what holds the wafer."),
    siliconAfter: optionalMeasured({ ...RULES.siliconThickness, label: "silicon after the step", source: "assumed" }),
    trimWidth: optionalMeasured({ ...RULES.trimWidth, source: "assumed" }),
    trimDepth: optionalMeasured({ ...RULES.trimDepth, source: "assumed" }),
    carrier: identifier,
    bondingMaterial: identifier,
    bondThickness: optionalMeasured({ ...RULES.bondThickness, source: "assumed" }),
    groundFaceForce: optionalMeasured({ ...RULES.faceForce, source: "assumed" }),
    films: z
      .array(filmChange)
      .max(20, "A step changes at most 20 films.")
      .optional()
      .transform((list) => list ?? []),
  })
  .superRefine((step, context) => {
    const fail = (path: (string | number)[], message: string) => context.addIssue({ code: "custom", path, message });
    if (step.kind === "bond") {
      if (!step.carrier) fail(["carrier"], "Choose the carrier that it is bonded to.");
      if (!step.bondingMaterial) fail(["bondingMaterial"], "Choose the bonding material.");
      if (!step.bondThickness) fail(["bondThickness", "value"], "Type the thickness of the bond.");
    }
    if (step.kind === "grind" && !step.siliconAfter)
      fail(["siliconAfter", "value"], "Type the silicon that remains after the grind.");
    if (step.kind === "edge trim" && !(step.trimWidth && step.trimDepth))
      fail([step.trimWidth ? "trimDepth" : "trimWidth", "value"], "Type the width and the depth of the trim.");
    step.films.forEach((film, index) => {
      if (film.change === "adds" && !film.thickness)
        fail(["films", index, "thickness", "value"], "Type the film thickness. Blank is missing, not zero.");
    });
  });
export type StepValues = z.output<typeof stepSchema>;
