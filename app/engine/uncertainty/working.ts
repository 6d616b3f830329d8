import type { UnitSymbol, Working, WorkingLine } from "../working.ts";
import { firstOrderUncertainty, type FirstOrderInput } from "./first-order.ts";
import { lotShare, type LotInput } from "./lot.ts";
import { sampleUncertainty, type SamplingInput } from "./sample-uncertainty.ts";

/** What a figure is called and measured in, for its working. */
export interface FigureName {
  symbol: string;
  meaning: string;
  unit: UnitSymbol;
}

/** The standard uncertainty of `firstOrderUncertainty` as data: the share of every input, then their sum. */
export function firstOrderWorking(i: FirstOrderInput, { symbol, meaning, unit }: FigureName): Working {
  const { value, lines, standardUncertainty, remark } = firstOrderUncertainty(i);
  return {
    equation: "first-order-uncertainty",
    inputs: [
      { symbol, meaning, value, unit },
      ...lines.map(({ input, contribution }, n) => ({
        symbol: `u_${n + 1}`,
        meaning: `share of ${input}`,
        value: contribution,
        unit,
      })),
    ],
    result: { symbol: "u", meaning: `standard uncertainty of the ${meaning}`, value: standardUncertainty, unit },
    note: remark,
  };
}

/** The standard uncertainty of `sampleUncertainty` as data. */
export function sampledWorking(i: SamplingInput, { meaning, unit }: FigureName): Working {
  const { draws, mean, standardErrorOfMean, standardUncertainty, interval } = sampleUncertainty(i);
  return {
    equation: "monte-carlo-uncertainty",
    inputs: [
      drawsLine(draws),
      { symbol: "f_m", meaning: `mean of the ${meaning}`, value: mean, unit },
      { symbol: "s_m", meaning: "standard error of that mean", value: standardErrorOfMean, unit },
      { symbol: "f_low", meaning: "lower end of the 95 % interval", value: interval[0], unit },
      { symbol: "f_high", meaning: "upper end of the 95 % interval", value: interval[1], unit },
    ],
    result: { symbol: "u", meaning: `standard uncertainty of the ${meaning}`, value: standardUncertainty, unit },
    note: `Seed ${i.seed}; the same seed gives the same draws.`,
  };
}

/** The probability of exceeding `limit` by `sampleUncertainty` as data. */
export function sampledChanceWorking(i: SamplingInput, limit: number, { meaning, unit }: FigureName): Working {
  const sampled = sampleUncertainty(i);
  const { probability, standardError } = sampled.chanceAbove(limit);
  return {
    equation: "monte-carlo-uncertainty",
    inputs: [
      drawsLine(sampled.draws),
      { symbol: "L", meaning: `limit of the ${meaning}`, value: limit, unit },
      { symbol: "s_P", meaning: "standard error of the probability", value: standardError, unit: "1" },
    ],
    result: { symbol: "P", meaning: `probability that the ${meaning} is beyond it`, value: probability, unit: "1" },
    note: `Seed ${i.seed}; the same seed gives the same draws.`,
  };
}

/** The share of `lotShare` as data. */
export function lotShareWorking(i: LotInput, { meaning, unit }: FigureName): Working {
  const { share, standardUncertainty } = lotShare(i);
  return {
    equation: "lot-share",
    inputs: [
      drawsLine(i.lots * i.wafers),
      { symbol: "L", meaning: `limit of the ${meaning}`, value: i.limit, unit },
      {
        symbol: "u(P)",
        meaning: "standard uncertainty of the share, from what is common to the lot",
        value: standardUncertainty,
        unit: "1",
      },
    ],
    result: { symbol: "P", meaning: "share of wafers beyond the limit", value: share, unit: "1" },
    note: `Seed ${i.seed}; the same seed gives the same draws.`,
  };
}

function drawsLine(draws: number): WorkingLine {
  return { symbol: "N", meaning: "number of draws", value: draws, unit: "1" };
}
