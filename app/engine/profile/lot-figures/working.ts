import type { UnitSymbol, Working } from "../../working.ts";
import { acceptedValue, type AcceptedReading } from "./accepted-value.ts";
import { controlChart, type ChartValue, type ControlLimits } from "./control-chart.ts";
import { predictedAgainstMeasured, type ParityPoint } from "./predicted-against-measured.ts";

/** The upper limit of `controlChart` as data, in the unit of the values. */
export function controlLimitsWorking(values: readonly ChartValue[], unit: UnitSymbol, given?: ControlLimits): Working {
  const { limits } = controlChart(values, given);
  return {
    equation: "control-limits",
    inputs: [
      { symbol: "m", meaning: "mean of the values that count", value: limits.centre, unit },
      { symbol: "MR", meaning: "mean moving range", value: limits.meanRange, unit },
      { symbol: "n", meaning: "values that they come from", value: limits.from, unit: "1" },
      { symbol: "L_low", meaning: "lower limit", value: limits.lower, unit },
      { symbol: "L_MR", meaning: "limit of the moving range", value: limits.rangeLimit, unit },
    ],
    result: { symbol: "L", meaning: "upper limit", value: limits.upper, unit },
  };
}

/** The standard uncertainty of `acceptedValue` as data. */
export function acceptedValueWorking(readings: readonly AcceptedReading[], unit: UnitSymbol, common = 0): Working {
  const found = acceptedValue(readings, common);
  return {
    equation: "accepted-value",
    inputs: [
      { symbol: "m", meaning: "mean of the accepted values", value: found.mean, unit },
      { symbol: "s", meaning: "standard deviation about it", value: found.spread, unit },
      { symbol: "n", meaning: "values that count", value: found.count, unit: "1" },
      { symbol: "u_c", meaning: "common to all of them", value: common, unit },
    ],
    result: {
      symbol: "u",
      meaning: "standard uncertainty of the next film, for k = 2",
      value: found.standardUncertainty,
      unit,
    },
    note: found.remark ?? undefined,
  };
}

/** Bias and slope of `predictedAgainstMeasured` over all steps as data. */
export function parityWorking(points: readonly ParityPoint[], unit: UnitSymbol): Working {
  const { all } = predictedAgainstMeasured(points);
  return {
    equation: "predicted-slope",
    inputs: [
      { symbol: "n", meaning: "points", value: all.count, unit: "1" },
      ...(all.slope
        ? [
            { symbol: "b", meaning: "slope", value: all.slope.value, unit: "1" as const },
            {
              symbol: "u_b",
              meaning: "its standard uncertainty",
              value: all.slope.standardUncertainty,
              unit: "1" as const,
            },
          ]
        : []),
      { symbol: "s", meaning: "standard deviation of measured less predicted", value: all.spread, unit },
      { symbol: "u", meaning: "standard uncertainty of the bias", value: all.biasUncertainty, unit },
    ],
    result: { symbol: "d", meaning: "bias, mean of measured less predicted", value: all.bias, unit },
    note: all.sentence,
  };
}
