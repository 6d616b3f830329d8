import type { CalibratedValue, Calibration } from "#app/engine/calibration/calibrate-pair.ts";
import { withCalibration } from "#app/engine/calibration/pair-model.ts";
import type { BondInput, FlowInput } from "#app/engine/flow/model.ts";
import { sagittasAfter } from "#app/engine/inverse/flow-questions.ts";
import type { Measured } from "#app/engine/measured.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import { formatNumber } from "#app/engine/units/format-number.ts";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import type { MeasuredBow } from "#app/schemas/calibration.ts";
import type { CalibrationResult, FittedValue, ResidualRow } from "./calibration-view.ts";
import { formatMeasured, withoutUnit } from "./format-measured.ts";
import type { ShownWorking } from "./shown-working.ts";

type Fitted = Extract<Calibration, { kind: "fitted" }>;

/** Half-width of the rectangular interval whose standard uncertainty is `u`. */
export const toleranceOf = (u: number) => u * Math.sqrt(3);

const SHOWN = {
  lockedInModulus: { label: "Locked-in modulus", dimension: "stress", unit: "MPa" },
  carrierExpansion: { label: "Carrier expansion", dimension: "expansion", unit: "ppm/K" },
} as const;

function fittedValue({ quantity, value, standardUncertainty }: CalibratedValue, bond: BondInput): FittedValue {
  const { label, dimension, unit } = SHOWN[quantity];
  const ofModulus = quantity === "lockedInModulus";
  const stated: Measured | null = ofModulus ? bond.material.effectiveModulus : bond.carrier.expansion;
  return {
    label,
    of: ofModulus ? bond.material.name : bond.carrier.name,
    stated: stated ? formatMeasured(stated, dimension, { unit }) : "not given",
    fitted: formatWithUncertainty(value, 2 * standardUncertainty, dimension, { unit }),
  };
}

const micrometres = (value: number) =>
  withoutUnit(formatQuantity(value, "length", { unit: "µm", decimals: 1, sign: true }));

function residualRows(fit: Fitted, flow: FlowInput, bows: readonly MeasuredBow[]): ResidualRow[] {
  const [stated, fitted] = [sagittasAfter(flow), sagittasAfter(withCalibration(flow, fit.values))];
  const bowOf = (sagittas: (number | null)[], step: number) => {
    const sagitta = sagittas[step - 1] ?? null;
    return sagitta === null ? "–" : micrometres(standardBow(sagitta));
  };
  return bows.map(({ step, bow, standardUncertainty }, n) => ({
    step,
    title: flow.steps[step - 1]?.title ?? "",
    measured: micrometres(bow),
    stated: bowOf(stated, step),
    fitted: bowOf(fitted, step),
    // The engine's residuals have the sign of the curvature.
    residual: micrometres(standardBow(fit.residuals[n] ?? 0)),
    uncertainty: withoutUnit(formatQuantity(standardUncertainty, "length", { unit: "µm", significant: 2 })),
  }));
}

/** What the scatter of the bows about the fit says, χ² against its expectation plus twice its standard deviation. */
function scatterOf({ chiSquare, degreesOfFreedom: free }: Fitted): { scatter: string; doubt: boolean } {
  if (free === 0)
    return { scatter: "There are as many values as bows, so nothing is left to check the fit with.", doubt: false };
  const figures = `χ² is ${formatNumber(chiSquare, { significant: 2 })} with ${free} ${free === 1 ? "degree" : "degrees"} of freedom`;
  return chiSquare > free + 2 * Math.sqrt(2 * free)
    ? {
        scatter: `The bows scatter more than their stated uncertainties allow: ${figures}. A bow is off, or an input that was taken as exact.`,
        doubt: true,
      }
    : { scatter: `The bows scatter no more than their stated uncertainties allow: ${figures}.`, doubt: false };
}

interface CalibrationContext {
  flow: FlowInput;
  bond: BondInput;
  bows: MeasuredBow[];
  workings: ShownWorking[];
  sent: [string, string][];
}

/** The engine's calibration in words and text. `sent` is what was fitted, as the form sent it. */
export function calibrationResult(
  calibration: Calibration,
  { flow, bond, bows, workings, sent }: CalibrationContext,
): CalibrationResult {
  if (calibration.kind === "refused") return calibration;
  const values = calibration.values.map((value) => fittedValue(value, bond));
  const correlation = calibration.correlation[0]?.[1];
  const fits = values.map(({ label, fitted }, n) => `${n === 0 ? label : label.toLowerCase()} ${fitted}`).join(" and ");
  return {
    kind: "fitted",
    answer: `${fits} ${values.length === 1 ? "fits" : "fit"} ${bows.length === 1 ? "the measured bow" : `the ${bows.length} measured bows`} best.`,
    ...scatterOf(calibration),
    values,
    correlation: correlation === undefined ? null : formatNumber(correlation, { decimals: 2 }),
    residuals: residualRows(calibration, flow, bows),
    workings,
    sent,
  };
}
