import { warpWorking } from "../rules/warp-working.ts";
import { shapeAfter } from "../inverse/flow-questions.ts";
import type { UnitSymbol, Working, WorkingLine } from "../working.ts";
import { calibratePair } from "./calibrate-pair.ts";
import { withCalibration, type Calibrated, type PairMeasurement } from "./pair-model.ts";

const NAMES: Record<Calibrated, { symbol: string; meaning: string; unit: UnitSymbol }> = {
  lockedInModulus: { symbol: "E", meaning: "locked-in modulus of the bonding material", unit: "Pa" },
  carrierExpansion: { symbol: "α", meaning: "mean expansion of the carrier", unit: "1/K" },
};

/**
 * The values of `calibratePair` as data, one working for each: the measured bows with their uncertainties, what the fit leaves of
 * them, and the bow of the first pair with the fitted values. Empty when the calibration is refused.
 */
export function calibrationWorkings(
  measurements: readonly PairMeasurement[],
  quantities: readonly Calibrated[],
): Working[] {
  const found = calibratePair(measurements, quantities);
  if (found.kind === "refused") return [];
  const inputs = measurements.flatMap(({ step, sagitta, standardUncertainty }, n): WorkingLine[] => [
    { symbol: `s_${n + 1}`, meaning: `measured after step ${step}, positive for a bowl`, value: sagitta, unit: "m" },
    { symbol: `u_${n + 1}`, meaning: "its standard uncertainty", value: standardUncertainty, unit: "m" },
    { symbol: `f_${n + 1}`, meaning: "the same as fitted", value: sagitta - (found.residuals[n] ?? 0), unit: "m" },
  ]);
  const misfit: WorkingLine[] = [
    { symbol: "χ^2", meaning: "misfit", value: found.chiSquare, unit: "1" },
    { symbol: "ν", meaning: "degrees of freedom", value: found.degreesOfFreedom, unit: "1" },
  ];
  const [first] = measurements;
  const behind = first ? [warpWorking(shapeAfter(withCalibration(first.flow, found.values), first.step))] : [];
  return found.values.map(({ quantity, value, standardUncertainty }) => {
    const { symbol, meaning, unit } = NAMES[quantity];
    return {
      equation: "pair-calibration",
      inputs: [
        ...inputs,
        ...misfit,
        { symbol: `u(${symbol})`, meaning: "standard uncertainty of the value", value: standardUncertainty, unit },
      ],
      result: { symbol, meaning, value, unit },
      note: "All other inputs count as exact.",
      from: behind,
    };
  });
}
