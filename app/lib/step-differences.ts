import { formatMeasured } from "#app/lib/format-measured.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { StepDifference } from "#app/schemas/flow-plan.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { filmCutWords } from "./film-cut.ts";
import { stepHandlingWords } from "./step-handling-words.ts";
import type { ExplainedChoice, StepChoices } from "./flow-step-choices.ts";

const NOTHING = "blank";

const figure = (value: number | null, dimension: Dimension, unit?: string) =>
  value === null ? NOTHING : formatQuantity(value, dimension, { unit });
const measuredWords = (measured: Measured | null, dimension: Dimension, unit: string) =>
  measured ? `${formatMeasured(measured, dimension, { unit })}, ${measured.source}` : NOTHING;
const choiceWords = (list: ExplainedChoice[], id: string | null) =>
  id === null ? NOTHING : (list.find((each) => each.id === id)?.name ?? "no longer in the library");

const pieceWords = ({ pieces }: StepChoices, id: string | null) =>
  id === null ? NOTHING : (pieces.find((piece) => piece.id === id)?.mark ?? "no longer in the library");

function filmWords({ films }: StepValues, choices: StepChoices): string {
  if (films.length === 0) return "none";
  return films
    .map(({ change, side, film, thickness, stress, coverage, lines }) =>
      [
        `${change} ${choiceWords(choices.films, film)}`,
        side === "front" ? "device side" : "back side",
        thickness && measuredWords(thickness, "length", "µm"),
        stress && measuredWords(stress, "stress", "MPa"),
        coverage !== null && filmCutWords({ coverage, lines }),
      ]
        .filter(Boolean)
        .join(", "),
    )
    .join("; ");
}

/** A step's fields as labelled text, in the order of its form. */
function stepWords(step: StepValues, choices: StepChoices): [label: string, words: string][] {
  return [
    ["What is done", step.title],
    ["Kind of step", step.kind],
    ["Peak temperature", figure(step.peakTemperature, "temperature", "°C")],
    ["Time at peak", figure(step.holdTime, "time", "min")],
    ["Tool", choiceWords(choices.tools, step.equipment)],
    ["Held by, as planned", step.planned],
    ["Exposed to", step.exposures.toSorted().join(", ") || "nothing"],
    ["Silicon after the step", measuredWords(step.siliconAfter, "length", "µm")],
    ["Force of the ground face", measuredWords(step.groundFaceForce, "forcePerLength", "N/m")],
    ["Width of the trim", measuredWords(step.trimWidth, "length", "mm")],
    ["Depth of the trim", measuredWords(step.trimDepth, "length", "µm")],
    ["Carrier", choiceWords(choices.carriers, step.carrier)],
    ["Piece of the carrier", pieceWords(choices, step.handling.carrierPiece)],
    ["Bonding material", choiceWords(choices.materials, step.bondingMaterial)],
    ["Thickness of the bond", measuredWords(step.bondThickness, "length", "µm")],
    ["Tape of the library", choiceWords(choices.tapes, step.tape)],
    ["Films", filmWords(step, choices)],
    ...stepHandlingWords(step.handling).map(([label, words]): [string, string] => [label, words ?? NOTHING]),
  ];
}

/** The fields in which a step that was typed differs from the one that somebody else has saved. */
export function stepDifferences(mine: StepValues, theirs: StepValues, choices: StepChoices): StepDifference[] {
  const other = new Map(stepWords(theirs, choices));
  return stepWords(mine, choices).flatMap(([label, words]) => {
    const saved = other.get(label) ?? NOTHING;
    return words === saved ? [] : [{ label, mine: words, theirs: saved }];
  });
}
