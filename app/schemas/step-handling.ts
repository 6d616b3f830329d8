import { z } from "zod";
import { CONTACT_MEANS, RESISTANCE_WORDS, SOLVENT_FAMILIES } from "#app/engine/flow/handling-inputs.ts";
import { EXPOSURES, FACES_UP, type Exposure } from "#app/engine/vocabulary.ts";
import { exposureKey } from "#app/lib/exposure-key.ts";
import { readSlots } from "#app/lib/step-slots.ts";
import { readProfile } from "#app/lib/temperature-profile.ts";
import { optionalMeasured, optionalQuantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";

/** A choice that may be left open, as null. */
const optionalChoice = <Word extends string>(words: readonly Word[]) =>
  z
    .union([z.enum(words as [Word, ...Word[]]), z.literal("")], "Choose one of the list.")
    .optional()
    .transform((word): Word | null => word || null);

/** One of a list by its id, or none of it. */
export const identifier = z
  .union([z.uuid("Choose one of the list."), z.literal("")], "Choose one of the list.")
  .optional()
  .transform((id) => id || null);

const yesOrNo = optionalChoice(["yes", "no"]).transform((word) => (word === null ? null : word === "yes"));

const times = z
  .object(
    Object.fromEntries(
      EXPOSURES.map((exposure) => [exposureKey(exposure), optionalQuantity({ ...RULES.holdTime, label: "time" })]),
    ),
  )
  .optional()
  .transform((typed): Partial<Record<Exposure, number>> =>
    Object.fromEntries(
      EXPOSURES.flatMap((exposure) => {
        const time = typed?.[exposureKey(exposure)];
        return typeof time === "number" ? [[exposure, time]] : [];
      }),
    ),
  );

/** A line of text that may be left blank, as null. */
const optionalLine = (longest: number) =>
  z
    .string()
    .trim()
    .max(longest, `Keep it under ${longest} characters.`)
    .optional()
    .transform((line) => line || null);

const temperatureProfile = z
  .string()
  .max(2000, "That is too long for a profile.")
  .optional()
  .transform((typed, context) => {
    const read = readProfile(typed);
    if (read.ok) return read.profile;
    context.addIssue({ code: "custom", message: read.message });
    return z.NEVER;
  });

/** Slots of the cassette; all of them are null, as a blank is. */
const slots = z
  .string()
  .max(200, "That is too long for a list of slots.")
  .optional()
  .transform((typed, context) => {
    const read = readSlots(typed);
    if (read.ok) return read.slots;
    context.addIssue({ code: "custom", message: read.message });
    return z.NEVER;
  });

const assumed = { source: "assumed" } as const;

/** What the handling rules ask of a step beyond its physics. All of it may be left blank, which is missing. */
export const stepHandling = z.object({
  /** s, by exposure */
  exposureTimes: times,
  solvent: optionalChoice(SOLVENT_FAMILIES),
  dehydrationBake: yesOrNo,
  contactFace: optionalChoice(["front", "back"]),
  contactMeans: optionalChoice(CONTACT_MEANS),
  /** s */
  timeSincePrevious: optionalQuantity({ ...RULES.holdTime, label: "time since the step before" }),
  inLine: yesOrNo,
  bumpHeight: optionalMeasured({ ...RULES.featureHeight, label: "bump height", ...assumed }),
  bumpPeelForce: optionalMeasured({ ...RULES.peelForce, ...assumed }),
  topography: optionalMeasured({ ...RULES.featureHeight, label: "height of the tallest feature", ...assumed }),
  viaProtrusion: optionalMeasured({ ...RULES.featureHeight, label: "height of the vias", ...assumed }),
  thicknessVariation: optionalMeasured({ ...RULES.thicknessVariation, ...assumed }),
  bondFace: optionalChoice(["front", "back"]),
  debondFace: optionalChoice(["front", "back"]),
  bondThicknessVariation: optionalMeasured({ ...RULES.thicknessVariation, ...assumed }),
  /** s, K; the step's peak and hold time follow from it */
  profile: temperatureProfile,
  sideUp: optionalChoice(FACES_UP),
  machine: optionalLine(60),
  recipe: optionalLine(120),
  /** that take the step, from 1, in order; null for all */
  slots,
  /** id of the piece of the carrier that is bonded */
  carrierPiece: identifier,
  tapeName: optionalLine(120),
  tapeTemperatureLimit: optionalMeasured({
    ...RULES.temperature,
    toleranceDimension: "temperatureDifference",
    ...assumed,
  }),
  tapeEmbeddingDepth: optionalMeasured({ ...RULES.embeddingDepth, ...assumed }),
  tapeThicknessVariation: optionalMeasured({ ...RULES.thicknessVariation, ...assumed }),
  tapeLongestTime: optionalMeasured({ ...RULES.timeOnTape, ...assumed }),
  tapeReleasesInLight: yesOrNo,
  tapeVacuum: optionalChoice(RESISTANCE_WORDS),
  tapePlasma: optionalChoice(RESISTANCE_WORDS),
  tapeSolvent: optionalChoice(RESISTANCE_WORDS),
  tapeAcid: optionalChoice(RESISTANCE_WORDS),
  tapeBase: optionalChoice(RESISTANCE_WORDS),
  tapeUltraviolet: optionalChoice(RESISTANCE_WORDS),
});
export type StepHandlingValues = z.output<typeof stepHandling>;
