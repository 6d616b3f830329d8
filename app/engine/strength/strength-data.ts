import type { SourceId } from "../sources.ts";

/** How a silicon face or edge was left by its last step. */
export type Finish =
  | "coarse ground"
  | "rough ground"
  | "fine ground"
  | "dry polished"
  | "wet etched"
  | "plasma etched"
  | "chemically mechanically polished"
  | "pristine";

/** Strength of silicon after a finish: either measured by somebody, or a range for want of better. */
export interface StrengthDatum {
  finish: Finish;
  /** What was tested, in words. */
  specimen: string;
  /** Characteristic strength, lowest and highest, Pa; null where only a gain is known. */
  characteristicStrength: readonly [number, number] | null;
  /** Single values as printed, Pa, in the order of the source. */
  values?: readonly number[];
  /** Weibull modulus, lowest and highest; null where it was not given. */
  weibullModulus: readonly [number, number] | null;
  /** Gain in strength over the ground face, as a share of it. */
  gain?: number;
  source: SourceId;
  note?: string;
}

const trade = "common-practice" satisfies SourceId;

/** Strengths of silicon by finish. Ranges without a publication are a first guess and no more; a site puts in its own. */
export const STRENGTH_DATA: readonly StrengthDatum[] = [
  {
    finish: "coarse ground",
    specimen: "whole (111) wafers of 100 mm, ground from 0.53 to 0.36 mm, biaxial flexure, by direction of the swirl",
    characteristicStrength: [100e6, 136e6],
    values: [136e6, 124e6, 100e6, 103e6],
    weibullModulus: null,
    source: "mcguire-1997",
    note: "Mean strengths; no Weibull modulus in the abstract.",
  },
  {
    finish: "wet etched",
    specimen: "dies of 100 µm, 25 µm etched off after grinding",
    characteristicStrength: null,
    weibullModulus: null,
    gain: 0.204,
    source: "jiun-2006",
  },
  {
    finish: "plasma etched",
    specimen: "dies of 75 µm, 25 µm etched off after grinding",
    characteristicStrength: null,
    weibullModulus: null,
    gain: 0.364,
    source: "jiun-2006",
  },
  {
    finish: "pristine",
    specimen: "small plates with fine finishes, planar biaxial flexure, reference strength of the Weibull fit",
    characteristicStrength: [1.2e9, 4.6e9],
    weibullModulus: null,
    source: "chen-ayon-spearing-1998",
  },
  /* @__PURE__ */ range("rough ground", 150e6, 350e6, 2, 5),
  /* @__PURE__ */ range("fine ground", 300e6, 700e6, 3, 8),
  /* @__PURE__ */ range("dry polished", 600e6, 1200e6, 4, 8),
  /* @__PURE__ */ range("wet etched", 360e6, 2100e6, 3, 8, "From 1.2 times fine ground to 3 times after a deep etch."),
  /* @__PURE__ */ range("plasma etched", 410e6, 1500e6, 4, 10),
  /* @__PURE__ */ range("chemically mechanically polished", 800e6, 1800e6, 5, 12),
];

function range(
  finish: Finish,
  low: number,
  high: number,
  leastModulus: number,
  mostModulus: number,
  note = "Range remembered from several papers, none of them read for it.",
): StrengthDatum {
  return {
    finish,
    specimen: "dies, back face in tension",
    characteristicStrength: [low, high],
    weibullModulus: [leastModulus, mostModulus],
    source: trade,
    note,
  };
}
