import type { Dimension } from "#app/engine/units/dimensions.ts";
import { EXPOSURES } from "#app/engine/vocabulary.ts";
import type { Measured } from "#app/engine/measured.ts";
import { exposureKey } from "#app/lib/exposure-key.ts";
import { measuredText, quantityText } from "#app/lib/form-values.ts";
import { slotsText } from "#app/lib/step-slots.ts";
import { profileText } from "#app/lib/temperature-profile.ts";
import type { StepHandlingValues } from "#app/schemas/step-handling.ts";
import type { MeasuredText } from "../forms/MeasuredField.tsx";

/** What the handling rules ask of a step, as the text of its form. */
export type StepHandlingText = {
  [Key in keyof Omit<StepHandlingValues, "exposureTimes">]: StepHandlingValues[Key] extends Measured | null
    ? MeasuredText
    : string;
} & { exposureTimes: Record<string, string> };

const yesOrNo = (answer: boolean | null) => (answer === null ? "" : answer ? "yes" : "no");
const text = (measured: Measured | null, dimension: Dimension, unit: string) =>
  measuredText(measured, dimension, { unit });

export function stepHandlingText(handling: StepHandlingValues): StepHandlingText {
  const length = (measured: Measured | null) => text(measured, "length", "µm");
  return {
    exposureTimes: Object.fromEntries(
      EXPOSURES.map((exposure) => [
        exposureKey(exposure),
        quantityText(handling.exposureTimes[exposure], "time", "min"),
      ]),
    ),
    solvent: handling.solvent ?? "",
    dehydrationBake: yesOrNo(handling.dehydrationBake),
    contactFace: handling.contactFace ?? "",
    contactMeans: handling.contactMeans ?? "",
    timeSincePrevious: quantityText(handling.timeSincePrevious, "time", "h"),
    inLine: yesOrNo(handling.inLine),
    bumpHeight: length(handling.bumpHeight),
    bumpPeelForce: text(handling.bumpPeelForce, "forcePerLength", "N/m"),
    topography: length(handling.topography),
    viaProtrusion: length(handling.viaProtrusion),
    thicknessVariation: length(handling.thicknessVariation),
    bondFace: handling.bondFace ?? "",
    debondFace: handling.debondFace ?? "",
    bondThicknessVariation: length(handling.bondThicknessVariation),
    profile: profileText(handling.profile),
    sideUp: handling.sideUp ?? "",
    machine: handling.machine ?? "",
    recipe: handling.recipe ?? "",
    slots: slotsText(handling.slots),
    carrierPiece: handling.carrierPiece ?? "",
    tapeName: handling.tapeName ?? "",
    tapeTemperatureLimit: measuredText(handling.tapeTemperatureLimit, "temperature", {
      unit: "°C",
      toleranceDimension: "temperatureDifference",
      toleranceUnit: "K",
    }),
    tapeEmbeddingDepth: length(handling.tapeEmbeddingDepth),
    tapeThicknessVariation: length(handling.tapeThicknessVariation),
    tapeLongestTime: text(handling.tapeLongestTime, "time", "d"),
    tapeReleasesInLight: yesOrNo(handling.tapeReleasesInLight),
    tapeVacuum: handling.tapeVacuum ?? "",
    tapePlasma: handling.tapePlasma ?? "",
    tapeSolvent: handling.tapeSolvent ?? "",
    tapeAcid: handling.tapeAcid ?? "",
    tapeBase: handling.tapeBase ?? "",
    tapeUltraviolet: handling.tapeUltraviolet ?? "",
  };
}
