import { EngineInputError } from "../errors.ts";
import { sagittasAfter } from "../inverse/flow-questions.ts";
import { requireFinite, requireWithin } from "../inputs.ts";
import { leastSquares, type Fit } from "./least-squares.ts";
import { mostTelling } from "./most-telling.ts";
import {
  CALIBRATED,
  fromParameter,
  LEAST_KNOWN,
  statedValue,
  STEPS,
  toParameter,
  weightedResiduals,
  type Calibrated,
  type PairMeasurement,
} from "./pair-model.ts";

export interface CalibratedValue {
  quantity: Calibrated;
  /** Pa or 1/K */
  value: number;
  standardUncertainty: number;
}

export type Calibration =
  | {
      kind: "fitted";
      values: CalibratedValue[];
      /** between the values, in their order, −1 to 1 (the modulus by its logarithm) */
      correlation: number[][];
      chiSquare: number;
      degreesOfFreedom: number;
      /** measured less fitted, m */
      residuals: number[];
    }
  | { kind: "refused"; reason: string; wouldHelp: string | null };

/** From here on two values cannot be told apart by the measurements at hand. */
const INSEPARABLE = 0.999;
/** Factors of the stated modulus from which the search starts, so that it does not end in a side valley. */
const STARTS = [0.1, 0.4, 1, 4];
/** Rounds from each start before the best of them is followed to its end. */
const FIRST_ROUNDS = 3;

/**
 * Locked-in modulus of the bonding material and expansion of the carrier from measured bows of pairs, on the full walk with all
 * its history: weighted least squares, the modulus by its logarithm. All flows have the same material and carrier; their other
 * inputs are taken as exact, so what is wrong with those goes into the values.
 *
 * Refused when the measurements leave a value open: fewer of them than values, a modulus not known to a factor of two, an
 * expansion not to 1 ppm/K, or both changing the bows alike (correlation beyond 0.999). It then names the step of the first flow
 * after which a bow would tell most.
 * @throws EngineInputError when a measurement is out of range, its step held flat or without a bond
 */
export function calibratePair(
  measurements: readonly PairMeasurement[],
  quantities: readonly Calibrated[],
): Calibration {
  check(measurements, quantities);
  if (measurements.length < quantities.length)
    return refuse(
      measurements,
      quantities,
      `${measurements.length} measured ${measurements.length === 1 ? "bow" : "bows"} cannot give ${quantities.length} values.`,
    );
  const fit = bestFit(measurements, quantities);
  if (!fit)
    return { kind: "refused", reason: "The pairs cannot be computed near their stated values.", wouldHelp: null };
  const open = whatIsOpen(fit, quantities);
  if (open) return refuse(measurements, quantities, open);
  const covariance = fit.covariance ?? [];
  const uncertainty = quantities.map((_, n) => Math.sqrt(covariance[n]?.[n] ?? 0));
  return {
    kind: "fitted",
    values: quantities.map((quantity, n) => {
      const value = fromParameter(quantity, fit.parameters[n] ?? 0);
      const u = uncertainty[n] ?? 0;
      return { quantity, value, standardUncertainty: quantity === "lockedInModulus" ? value * u : u };
    }),
    correlation: covariance.map((row, i) =>
      row.map((value, j) => value / ((uncertainty[i] ?? 1) * (uncertainty[j] ?? 1))),
    ),
    chiSquare: fit.chiSquare,
    degreesOfFreedom: measurements.length - quantities.length,
    residuals: fit.residuals.map((residual, n) => residual * (measurements[n]?.standardUncertainty ?? 1)),
  };
}

function check(measurements: readonly PairMeasurement[], quantities: readonly Calibrated[]): void {
  if (quantities.length === 0) throw new EngineInputError("quantities", "name nothing to fit", CALIBRATED.join(" or "));
  if (measurements.length === 0) throw new EngineInputError("measurements", "are missing", "at least one");
  measurements.forEach(({ flow, step, sagitta, standardUncertainty }, n) => {
    const field = `measurements[${n}]`;
    requireFinite(`${field}.sagitta`, sagitta);
    requireWithin(`${field}.standardUncertainty`, standardUncertainty, 1e-10, 1, "m");
    if (!flow.steps.slice(0, step).some(({ bond }) => bond))
      throw new EngineInputError(`${field}.step`, "comes before anything is bonded");
    if (sagittasAfter(flow)[step - 1] === null)
      throw new EngineInputError(`${field}.step`, "is held flat and has no bow of its own");
    if (quantities.includes("carrierExpansion") && statedValue(flow, "carrierExpansion") === null)
      throw new EngineInputError(
        `${field}.flow`,
        "has a carrier that expands as silicon: there is no expansion to fit",
      );
  });
}

function bestFit(measurements: readonly PairMeasurement[], quantities: readonly Calibrated[]): Fit | null {
  const residuals = weightedResiduals(measurements, quantities);
  const steps = quantities.map((quantity) => STEPS[quantity]);
  const fits = STARTS.flatMap((factor) => {
    const start = quantities.map((quantity) => {
      const value = measurements[0] ? (statedValue(measurements[0].flow, quantity) ?? 0) : 0;
      return toParameter(quantity, quantity === "lockedInModulus" ? value * factor : value);
    });
    const useful = quantities.includes("lockedInModulus") || factor === 1;
    const fit = useful ? leastSquares({ residuals, start, steps }, FIRST_ROUNDS) : null;
    return fit ? [fit] : [];
  });
  const best = fits.reduce<Fit | null>((least, fit) => (!least || fit.chiSquare < least.chiSquare ? fit : least), null);
  return best && leastSquares({ residuals, start: best.parameters, steps });
}

const NAMES: Record<Calibrated, string> = {
  lockedInModulus: "locked-in modulus",
  carrierExpansion: "carrier expansion",
};

/** Which value the measurements leave open, in a sentence; null when none. */
function whatIsOpen({ covariance }: Fit, quantities: readonly Calibrated[]): string | null {
  const both = quantities.map((quantity) => NAMES[quantity]).join(" and ");
  if (!covariance) return `The measured bows do not tell the ${both} apart, or do not depend on one of them.`;
  for (const [n, quantity] of quantities.entries())
    if (Math.sqrt(covariance[n]?.[n] ?? Infinity) > LEAST_KNOWN[quantity])
      return `The measured bows leave the ${NAMES[quantity]} open: its uncertainty is larger than would be of use.`;
  const [first, second] = [covariance[0]?.[0] ?? 0, covariance[1]?.[1] ?? 0];
  if (quantities.length === 2 && Math.abs(covariance[0]?.[1] ?? 0) > INSEPARABLE * Math.sqrt(first * second))
    return `The measured bows do not tell the ${both} apart.`;
  return null;
}

function refuse(
  measurements: readonly PairMeasurement[],
  quantities: readonly Calibrated[],
  reason: string,
): Calibration {
  return { kind: "refused", reason, wouldHelp: mostTelling(measurements, quantities) };
}
