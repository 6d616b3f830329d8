import type { FlowInput } from "../flow/model.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { laminateWorking } from "../laminate/working.ts";
import { warpWorking } from "../rules/warp-working.ts";
import { estimateStack, freeDisc } from "../stack/estimate-stack.ts";
import { laminateOfStack } from "../stack/laminate-of-stack.ts";
import { withThickness, type StackInput } from "../stack/model.ts";
import { curlingThickness } from "../stack/thickness-sweep.ts";
import { stackWorking } from "../stack/working.ts";
import type { Dimension } from "../units/dimensions.ts";
import type { UnitSymbol, Working } from "../working.ts";
import { carrierExpansionFor, EXPANSIONS, shapeAfter, withCarrierExpansion } from "./flow-questions.ts";
import type { InverseAnswer } from "./solve-for.ts";
import {
  balancingFilm,
  leastThickness,
  mostFilm,
  withBackFilm,
  withFilm,
  type BackFilm,
  type SoughtFilm,
  type ThicknessRange,
} from "./stack-questions.ts";
import { answerInWords } from "./words.ts";

/** A quantity of a question: its words, and the two ways in which its unit is said. */
interface Name {
  meaning: string;
  unit: UnitSymbol;
  dimension: Dimension;
}

interface Asked {
  answer: InverseAnswer;
  figure: Name;
  input: Name;
  target: number;
  range: { from: number; to: number };
  /** calculations behind the figure at an input */
  behind: (input: number) => Working[];
}

const WARP: Name = { meaning: "warp of the free wafer", unit: "m", dimension: "length" };
const SILICON: Name = { meaning: "silicon thickness", unit: "m", dimension: "length" };
const FILM: Record<SoughtFilm["quantity"], Name> = {
  thickness: { meaning: "film thickness", unit: "m", dimension: "length" },
  stress: { meaning: "film stress", unit: "Pa", dimension: "stress" },
};

/**
 * The answer of `leastThickness` as data, with the calculations behind the warp there; without an answer, the warp that comes
 * nearest to the limit. null when the warp cannot be computed anywhere in the range.
 */
export function leastThicknessWorking(stack: StackInput, warpLimit: number, range: ThicknessRange): Working | null {
  return questionWorking({
    answer: leastThickness(stack, warpLimit, range),
    figure: WARP,
    input: SILICON,
    target: warpLimit,
    range: { from: range.thickest, to: range.thinnest },
    behind: (thickness) => warpBehind(withThickness(stack, thickness)),
  });
}

/** The answer of `mostFilm` as data; otherwise as `leastThicknessWorking`. */
export function mostFilmWorking(
  stack: StackInput,
  film: SoughtFilm,
  warpLimit: number,
  range: { from: number; to: number },
): Working | null {
  return questionWorking({
    answer: mostFilm(stack, film, warpLimit, range),
    figure: WARP,
    input: FILM[film.quantity],
    target: warpLimit,
    range,
    behind: (value) => warpBehind(withFilm(stack, film, value)),
  });
}

/** The thickness of `curlingThickness` as data: where the load over the critical one becomes 1; null when it does not. */
export function curlingThicknessWorking(stack: StackInput, upTo: number): Working | null {
  const thickness = curlingThickness(stack, upTo);
  if (thickness === null) return null;
  return {
    equation: "inverse-question",
    inputs: [
      { symbol: "f_0", meaning: "load over the load at which a free wafer begins to roll", value: 1, unit: "1" },
      { symbol: "x_1", meaning: "silicon thickness where the search begins", value: upTo, unit: "m" },
    ],
    result: { symbol: "x", meaning: "silicon thickness below which it rolls", value: thickness, unit: "m" },
    ...(thickness === upTo
      ? { note: "It rolls at the thickest silicon asked for, and so at every thinner one near it." }
      : {}),
    from: warpBehind(withThickness(stack, thickness)),
  };
}

/**
 * The thickness of `balancingFilm` as data, with the laminate that is flat; null without an answer, which `answerInWords` puts
 * into a sentence.
 */
export function balancingFilmWorking(stack: StackInput, film: BackFilm, range: ThicknessRange): Working | null {
  const { answer } = balancingFilm(stack, film, range);
  if (answer.kind === "no answer") return null;
  const balanced = withBackFilm(stack, film, answer.value);
  const temperature = stack.temperature ?? ROOM_TEMPERATURE;
  return {
    equation: "balancing-film",
    inputs: [
      {
        symbol: "T",
        meaning: "temperature at which it is flat",
        value: temperature,
        unit: "K",
        temperaturePoint: true,
      },
      {
        symbol: "κ",
        meaning: "curvature left, bowl positive",
        value: freeDisc(balanced).laminate.curvature,
        unit: "1/m",
      },
    ],
    result: { symbol: "h_b", meaning: "thickness of the back-side film", value: answer.value, unit: "m" },
    note: "At other temperatures the films no longer balance where they expand differently.",
    from: [laminateWorking(laminateOfStack(balanced), { temperature })],
  };
}

/** The answer of `carrierExpansionFor` as data; otherwise as `leastThicknessWorking`. */
export function carrierExpansionWorking(
  flow: FlowInput,
  step: number,
  sagitta: number,
  range: { from: number; to: number } = EXPANSIONS,
): Working | null {
  return questionWorking({
    answer: carrierExpansionFor(flow, step, sagitta, range),
    figure: {
      meaning: `centre to rim at 25\u00A0°C after step ${step}, positive for a bowl`,
      unit: "m",
      dimension: "length",
    },
    input: { meaning: "mean expansion of the carrier", unit: "1/K", dimension: "expansion" },
    target: sagitta,
    range,
    behind: (value) => [warpWorking(shapeAfter(withCarrierExpansion(flow, value), step))],
  });
}

function warpBehind(stack: StackInput): Working[] {
  const estimate = estimateStack(stack);
  return [stackWorking(stack, estimate).shape];
}

function questionWorking({ answer, figure, input, target, range, behind }: Asked): Working | null {
  const inputs: Working["inputs"] = [
    { symbol: "f_0", meaning: figure.meaning, value: target, unit: figure.unit },
    { symbol: "x_1", meaning: `${input.meaning} where the search begins`, value: range.from, unit: input.unit },
    { symbol: "x_2", meaning: `${input.meaning} where it ends`, value: range.to, unit: input.unit },
  ];
  const note = answerInWords(answer, {
    figure: figure.meaning,
    input: input.meaning,
    figureDimension: figure.dimension,
    inputDimension: input.dimension,
  });
  if (answer.kind === "answer")
    return {
      equation: "inverse-question",
      inputs,
      result: { symbol: "x", meaning: input.meaning, value: answer.value, unit: input.unit },
      note,
      from: behind(answer.value),
    };
  const nearest = answer.why === "always above" ? answer.least : answer.most;
  if (!nearest) return null;
  return {
    equation: "inverse-question",
    inputs: [
      ...inputs,
      { symbol: "x", meaning: `${input.meaning} nearest to it`, value: nearest.input, unit: input.unit },
    ],
    result: { symbol: "f", meaning: `${figure.meaning}, nearest`, value: nearest.value, unit: figure.unit },
    note,
    from: behind(nearest.input),
  };
}
