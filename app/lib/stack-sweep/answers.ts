import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { RULES } from "#app/schemas/ranges.ts";
import type { QuantityRule } from "../read-quantity.ts";
import { lengthWords, radiusWords } from "../stack-words.ts";
import type { SweptFigures } from "./figures.ts";

/** Something that a sweep can be asked for. */
export interface SweepAnswer {
  key: string;
  /** as a choice: 'Warp' */
  label: string;
  /** in a sentence: 'the warp' */
  noun: string;
  /** its value, which goes on smoothly where it means nothing; null where there is nothing to have it */
  field: (figures: SweptFigures) => number | null;
  /** beyond 1 it means nothing */
  beyond?: (figures: SweptFigures) => number;
  /** how a limit of it is typed */
  rule: QuantityRule;
  /** a limit of it holds to both sides of zero */
  signed: boolean;
  /** without a sign although the bend has one, so that it comes down to zero in a cusp */
  folded?: boolean;
  words: (value: number) => string;
  /** said where it has none */
  none: string;
}

const ROLLS = "no bow, it rolls";
const curvatureWords = (value: number) =>
  formatQuantity(value, "curvature", { unit: "1/m", significant: 3, trim: true, sign: true });

/** Everything that a sweep can be asked for; the first unless another is. */
export const SWEEP_ANSWERS: readonly SweepAnswer[] = [
  {
    key: "warp",
    label: "Warp",
    noun: "the warp",
    field: ({ warp }) => warp,
    beyond: ({ turn }) => turn,
    rule: RULES.warpLimit,
    signed: false,
    folded: true,
    words: (value) => lengthWords(value),
    none: "rolled past half a turn",
  },
  {
    key: "bow",
    label: "Bow, device side up",
    noun: "the bow",
    field: ({ bow }) => bow,
    beyond: ({ load }) => load,
    rule: RULES.warpLimit,
    signed: true,
    words: (value) => lengthWords(value, true),
    none: ROLLS,
  },
  {
    key: "along",
    label: "Curvature along the axis that bends most",
    noun: "the curvature",
    field: ({ along }) => along,
    rule: { ...RULES.curvature, range: { least: 0, most: 20, words: "0 to 20 1/m" } },
    signed: true,
    words: curvatureWords,
    none: "no curvature",
  },
  {
    key: "across",
    label: "Curvature across that axis",
    noun: "the curvature across",
    field: ({ across }) => across,
    rule: { ...RULES.curvature, range: { least: 0, most: 20, words: "0 to 20 1/m" } },
    signed: true,
    words: curvatureWords,
    none: "no curvature",
  },
  {
    key: "radius",
    label: "Radius of the roll",
    noun: "the radius of the roll",
    field: ({ along }) => (along === 0 ? null : 1 / Math.abs(along)),
    beyond: ({ load }) => (load > 0 ? 1 / load : Infinity),
    rule: { ...RULES.bendRadius, label: "radius" },
    signed: false,
    words: radiusWords,
    none: "it does not roll",
  },
  {
    key: "stress",
    label: "Largest stress in a film",
    noun: "the largest stress in a film",
    field: ({ filmStress }) => filmStress,
    rule: { ...RULES.stress, range: { least: 0, most: 1e10, words: "0 to 10 GPa" } },
    signed: false,
    words: (value) => formatQuantity(value, "stress", { unit: "MPa", significant: 3, trim: true }),
    none: "there is no film",
  },
  {
    key: "load",
    label: "Share of the curling load",
    noun: "the share of the curling load",
    field: ({ load }) => load,
    rule: { label: "share", dimension: "fraction", range: { least: 0, most: 100, words: "0 to 10 000 %" } },
    signed: false,
    folded: true,
    words: (value) => formatQuantity(value, "fraction", { unit: "%", significant: 3, trim: true }),
    none: "no load",
  },
];

/** What an answer is, or null where it means nothing. */
export function answerValue({ field, beyond }: SweepAnswer, figures: SweptFigures): number | null {
  return beyond && beyond(figures) > 1 ? null : field(figures);
}

export const answerOf = (key: string): SweepAnswer | undefined =>
  key === "" ? SWEEP_ANSWERS[0] : SWEEP_ANSWERS.find((answer) => answer.key === key);

/** A value of an input or answer in its unit, four digits. */
export const inUnit = (value: number, dimension: Dimension, unit: string) =>
  formatQuantity(value, dimension, { unit, significant: 4, trim: true });
