import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { Measured } from "#app/engine/measured.ts";
import { SIDE_NAMES, type Side } from "#app/engine/vocabulary.ts";
import type { StepHandlingValues } from "#app/schemas/step-handling.ts";
import { formatMeasured } from "./format-measured.ts";
import { profileWords } from "./temperature-profile.ts";

const yesOrNo = (answer: boolean | null) => (answer === null ? null : answer ? "yes" : "no");
const face = (side: Side | null) => side && SIDE_NAMES[side];
const time = (seconds: number | null) => (seconds === null ? null : formatQuantity(seconds, "time"));

const figure = (measured: Measured | null, dimension: Dimension, unit: string) =>
  measured && `${formatMeasured(measured, dimension, { unit })}, ${measured.source}`;
const length = (measured: Measured | null) => figure(measured, "length", "µm");

/** What is given for the handling rules, as labelled text in the order of the form; null for what is not given. */
export function stepHandlingWords(handling: StepHandlingValues): [label: string, words: string | null][] {
  const times = Object.entries(handling.exposureTimes).map(([exposure, seconds]) => `${exposure} ${time(seconds)}`);
  const limit = handling.tapeTemperatureLimit;
  return [
    ["Temperature profile", handling.profile && profileWords(handling.profile)],
    ["Machine", handling.machine],
    ["Recipe", handling.recipe],
    ["Side up", handling.sideUp],
    ["Time exposed", times.length > 0 ? times.join(", ") : null],
    ["Kind of solvent", handling.solvent],
    ["Baked dry before the vacuum", yesOrNo(handling.dehydrationBake)],
    ["Thickness variation that this thinning adds", length(handling.thicknessVariation)],
    ["How far vias stand out", length(handling.viaProtrusion)],
    ["Tape", handling.tapeName],
    ["Highest temperature of the tape", limit && formatQuantity(limit.value, "temperature", { unit: "°C" })],
    ["Soft layer of the tape", length(handling.tapeEmbeddingDepth)],
    ["Thickness variation of the tape", length(handling.tapeThicknessVariation)],
    ["Longest time on the tape", handling.tapeLongestTime && time(handling.tapeLongestTime.value)],
    ["Ultraviolet light lets the tape go", yesOrNo(handling.tapeReleasesInLight)],
    ["Tape in vacuum", handling.tapeVacuum],
    ["Tape in plasma", handling.tapePlasma],
    ["Tape in solvent", handling.tapeSolvent],
    ["Tape in acid", handling.tapeAcid],
    ["Tape in base", handling.tapeBase],
    ["Tape in ultraviolet light", handling.tapeUltraviolet],
    ["Face that is bonded", face(handling.bondFace)],
    ["Face that is let go", face(handling.debondFace)],
    ["Thickness variation of the bond", length(handling.bondThicknessVariation)],
    ["Face that is touched", face(handling.contactFace)],
    ["Touched with", handling.contactMeans],
    ["Time since the step before", time(handling.timeSincePrevious)],
    ["In line from the step before", yesOrNo(handling.inLine)],
    ["Height of the bumps", length(handling.bumpHeight)],
    ["Peel force that the bumps stood", figure(handling.bumpPeelForce, "forcePerLength", "N/m")],
    ["Tallest other feature", length(handling.topography)],
  ];
}
