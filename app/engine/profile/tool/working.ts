import type { UnitSymbol, Working } from "../../working.ts";
import { repeatabilityStudy } from "./repeatability.ts";

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
