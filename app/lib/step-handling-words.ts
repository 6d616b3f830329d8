import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { Measured } from "#app/engine/measured.ts";
import { runsInWords } from "#app/engine/runs-in-words.ts";
import type { TapeInput } from "#app/engine/flow/handling-inputs.ts";
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

/** What a step states of its tape: alone, or in place of what its tape of the library says, which stands where it says nothing. */
function besideLibrary(own: string | null, library: string | null): string | null {
  if (own === null) return library && `${library}, of the library`;
  return library === null || library === own ? own : `${own}, stated here in place of ${library} of the library`;
}

/**
 * What is given for the handling rules, as labelled text in the order of the form; null for what is not given.
 * @param tape the tape of the library that the step has chosen
 */
export function stepHandlingWords(
  handling: StepHandlingValues,
  tape: TapeInput | null = null,
): [label: string, words: string | null][] {
  const times = Object.entries(handling.exposureTimes).map(([exposure, seconds]) => `${exposure} ${time(seconds)}`);
  return [
    ["Temperature profile", handling.profile && profileWords(handling.profile)],
    ["Slots", handling.slots && runsInWords(handling.slots)],
    ["Machine", handling.machine],
    ["Recipe", handling.recipe],
    ["Side up", handling.sideUp],
    ["Time exposed", times.length > 0 ? times.join(", ") : null],
    ["Kind of solvent", handling.solvent],
    ["Baked dry before the vacuum", yesOrNo(handling.dehydrationBake)],
    ["Thickness variation that this thinning adds", length(handling.thicknessVariation)],
    ["How far vias stand out", length(handling.viaProtrusion)],
    ...tapeWords(handling, tape),
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

const RESISTANCES = [
  ["vacuum", "tapeVacuum", "Tape in vacuum"],
  ["plasma", "tapePlasma", "Tape in plasma"],
  ["solvent", "tapeSolvent", "Tape in solvent"],
  ["acid", "tapeAcid", "Tape in acid"],
  ["base", "tapeBase", "Tape in base"],
  ["ultraviolet", "tapeUltraviolet", "Tape in ultraviolet light"],
] as const;

function tapeWords(handling: StepHandlingValues, tape: TapeInput | null): [label: string, words: string | null][] {
  const limit = (measured: Measured | null | undefined) =>
    measured ? formatQuantity(measured.value, "temperature", { unit: "°C" }) : null;
  const days = (measured: Measured | null | undefined) => (measured ? time(measured.value) : null);
  return [
    ["Tape", besideLibrary(handling.tapeName, tape?.name ?? null)],
    [
      "Highest temperature of the tape",
      besideLibrary(limit(handling.tapeTemperatureLimit), limit(tape?.temperatureLimit)),
    ],
    [
      "Soft layer of the tape",
      besideLibrary(length(handling.tapeEmbeddingDepth), length(tape?.embeddingDepth ?? null)),
    ],
    [
      "Thickness variation of the tape",
      besideLibrary(length(handling.tapeThicknessVariation), length(tape?.thicknessVariation ?? null)),
    ],
    ["Longest time on the tape", besideLibrary(days(handling.tapeLongestTime), days(tape?.longestTime))],
    [
      "Ultraviolet light lets the tape go",
      besideLibrary(yesOrNo(handling.tapeReleasesInLight), yesOrNo(tape?.releasesInLight ?? null)),
    ],
    ...RESISTANCES.map(([name, own, label]): [string, string | null] => [
      label,
      besideLibrary(handling[own], tape?.resistances?.[name]?.word ?? null),
    ]),
  ];
}
