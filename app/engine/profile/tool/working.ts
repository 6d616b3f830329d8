import type { UnitSymbol, Working } from "../../working.ts";
import { referenceCheck, repeatabilityStudy } from "./repeatability.ts";

/** The standard uncertainty of `repeatabilityStudy` as data, in the unit of its readings. */
export function repeatabilityWorking(wafers: readonly (readonly number[])[], unit: UnitSymbol): Working {
  const study = repeatabilityStudy(wafers);
  return {
    equation: "repeatability",
    inputs: [
      ...study.wafers.map(({ standardDeviation, count }, n) => ({
        symbol: `s_${n + 1}`,
        meaning: `standard deviation of wafer ${n + 1}, ${count} readings`,
        value: standardDeviation,
        unit,
      })),
      { symbol: "s", meaning: "pooled standard deviation", value: study.standardUncertainty, unit },
      { symbol: "ν", meaning: "degrees of freedom", value: study.degreesOfFreedom, unit: "1" },
    ],
    result: { symbol: "u", meaning: "standard uncertainty of one reading, for k = 2", value: study.forTwo, unit },
    note: study.remark ?? undefined,
  };
}

/** The bias of `referenceCheck` as data, in the unit of its readings. */
export function referenceCheckWorking(i: Parameters<typeof referenceCheck>[0], unit: UnitSymbol): Working {
  const { bias, biasUncertainty } = referenceCheck(i);
  return {
    equation: "reference-check",
    inputs: [
      { symbol: "X", meaning: "known figure", value: i.known.value, unit },
      { symbol: "u_X", meaning: "its standard uncertainty", value: i.known.standardUncertainty, unit },
      { symbol: "u", meaning: "standard uncertainty of one reading", value: i.toolUncertainty, unit },
      { symbol: "n", meaning: "readings", value: i.readings.length, unit: "1" },
      { symbol: "u_b", meaning: "standard uncertainty of the bias", value: biasUncertainty, unit },
    ],
    result: { symbol: "b", meaning: "bias, read less known", value: bias, unit },
  };
}
