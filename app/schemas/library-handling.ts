import { z } from "zod";
import {
  CLAMPINGS,
  CONTACT_MEANS,
  RESISTANCE_WORDS,
  SOLVENT_FAMILIES,
  type Resistance,
} from "#app/engine/flow/handling-inputs.ts";
import { optionalMeasured, optionalQuantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { optionalChoice, yesOrNo } from "./record-fields.ts";

/**
 * What only the handling rules ask of the records of the library. All of it may be left blank, which is missing: a rule that
 * needs it says so. SI units.
 */

export const carrierHandling = z.object({
  metalInLight: yesOrNo,
  conductiveCoating: yesOrNo,
  seenBySensors: yesOrNo,
});
export type CarrierHandlingValues = z.output<typeof carrierHandling>;

/** A word with the longest time that it holds for; the time alone says nothing. */
const resistance = z
  .object({ word: optionalChoice(RESISTANCE_WORDS), longest: optionalQuantity(RULES.exposureTime) })
  .optional()
  .transform((typed, context): Resistance | null => {
    const { word = null, longest = null } = typed ?? {};
    if (word !== null && word !== "unknown") return longest === null ? { word } : { word, longest };
    if (longest !== null)
      context.addIssue({
        code: "custom",
        path: ["word"],
        message: "Say what it does for that time, or clear the time.",
      });
    return word && { word };
  });

const temperature = { ...RULES.temperature, toleranceDimension: "temperatureDifference" } as const;

const resistances = {
  vacuum: resistance,
  plasma: resistance,
  solvent: resistance,
  acid: resistance,
  base: resistance,
  ultraviolet: resistance,
  attackedBy: z.array(z.enum(SOLVENT_FAMILIES, "Choose from the list.")).max(SOLVENT_FAMILIES.length),
};

export const tapeHandling = z.object({ ...resistances, releasesInLight: yesOrNo });
export type TapeHandlingValues = z.output<typeof tapeHandling>;

export const bondingMaterialHandling = z.object({
  ...resistances,
  remover: optionalChoice(SOLVENT_FAMILIES),
  vacuumTemperatureLimit: optionalMeasured({ ...temperature, label: "temperature limit in vacuum" }),
  weightLoss: optionalMeasured({ ...RULES.share, label: "weight loss" }),
  limitTime: optionalMeasured({ ...RULES.exposureTime, label: "longest time at its limit" }),
  thermalTime: optionalMeasured({ ...RULES.exposureTime, label: "total time hot" }),
  releaseLight: optionalChoice(["ultraviolet", "infrared"]),
  peelForce: optionalMeasured(RULES.peelForce),
  peelRadius: optionalMeasured({ ...RULES.bendRadius, label: "bend radius at the peel front" }),
});
export type BondingMaterialHandlingValues = z.output<typeof bondingMaterialHandling>;

export const equipmentHandling = z
  .object({
    clamping: optionalChoice(CLAMPINGS),
    seal: optionalChoice(["plain", "compliant"]),
    sealGap: optionalMeasured({ ...RULES.gap, label: "gap that the seal closes" }),
    slotClearance: optionalMeasured({ ...RULES.gap, label: "clearance" }),
    weightLimit: optionalMeasured({ ...RULES.weight, label: "weight limit" }),
    totalThicknessLimit: optionalMeasured({ ...RULES.pairThickness, label: "thickness limit" }),
    sensesOptically: yesOrNo,
    contactFace: optionalChoice(["front", "back"]),
    contactMeans: optionalChoice(CONTACT_MEANS),
    ioniser: yesOrNo,
  })
  .superRefine(({ contactFace, contactMeans, clamping, seal, sealGap }, context) => {
    const fail = (field: string, message: string) => context.addIssue({ code: "custom", path: [field], message });
    if (contactFace !== null && contactMeans === null) fail("contactMeans", "Choose what it touches that face with.");
    if (contactMeans !== null && contactFace === null) fail("contactFace", "Choose the face that it touches.");
    if ((seal !== null || sealGap !== null) && clamping !== "vacuum" && clamping !== "full-area vacuum")
      fail("clamping", "Only a vacuum chuck has a seal: choose vacuum, or clear the seal and its gap.");
  });
export type EquipmentHandlingValues = z.output<typeof equipmentHandling>;

export const filmHandling = z.object({
  solderMelting: optionalMeasured({ ...temperature, label: "melting temperature of its solder" }),
  stressState: optionalChoice(["as deposited", "after heating"]),
  stressFilmThickness: optionalQuantity(RULES.filmThickness),
  monitorThickness: optionalQuantity({ ...RULES.siliconThickness, label: "monitor thickness" }),
  monitorDiameter: optionalQuantity({ ...RULES.diameter, label: "monitor diameter" }),
});
export type FilmHandlingValues = z.output<typeof filmHandling>;
