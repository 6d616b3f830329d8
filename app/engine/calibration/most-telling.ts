import { sagittasAfter } from "../inverse/flow-questions.ts";
import type { FlowInput } from "../flow/model.ts";
import { normal } from "./least-squares.ts";
import {
  LEAST_KNOWN,
  statedValue,
  STEPS,
  toParameter,
  weightedResiduals,
  type Calibrated,
  type PairMeasurement,
} from "./pair-model.ts";
import { invertSymmetric } from "./symmetric.ts";

/** The step of the first flow whose bow, measured as well as the best so far, would leave the least uncertainty. */
export function mostTelling(
  measurements: readonly PairMeasurement[],
  quantities: readonly Calibrated[],
): string | null {
  const [first] = measurements;
  if (!first) return null;
  const { flow } = first;
  const u = Math.min(...measurements.map(({ standardUncertainty }) => standardUncertainty));
  const stated = quantities.map((quantity) => toParameter(quantity, statedValue(flow, quantity) ?? 0));
  const rows = (list: readonly PairMeasurement[]) => {
    const residuals = weightedResiduals(list, quantities);
    const columns = quantities.map((quantity, n) => {
      const by = STEPS[quantity];
      const at = (sign: number) => residuals(stated.map((value, m) => (m === n ? value + sign * by : value)));
      const [up, down] = [at(1), at(-1)];
      // In units of the least that is of use, so that both values weigh alike.
      return list.map((_, k) => (((up?.[k] ?? 0) - (down?.[k] ?? 0)) / (2 * by)) * LEAST_KNOWN[quantity]);
    });
    return list.map((_, k) => columns.map((column) => column[k] ?? 0));
  };
  const known = rows(measurements);
  const bonded = flow.steps.findIndex((step) => step.bond);
  const sagittas = sagittasAfter(flow);
  const candidates = flow.steps
    .map((_, index): PairMeasurement => ({
      flow,
      step: index + 1,
      sagitta: sagittas[index] ?? 0,
      standardUncertainty: u,
    }))
    .filter(({ step }) => step > bonded && sagittas[step - 1] !== null)
    .filter(({ step }) => !measurements.some((one) => one.flow === flow && one.step === step));
  const added = rows(candidates);
  let best: { step: number; left: number } | null = null;
  candidates.forEach(({ step }, n) => {
    const left = worst(normal([...known, added[n] ?? []]));
    if (left < (best?.left ?? Infinity)) best = { step, left };
  });
  return best === null ? null : inWords(flow, best);
}

function inWords(flow: FlowInput, { step }: { step: number }): string {
  return `A bow of the pair after step ${step}, ${flow.steps[step - 1]?.title ?? ""}, would help most.`;
}

/** Largest uncertainty that a set of measurements leaves, without dimension; infinite where one value stays open. */
function worst(information: number[][]): number {
  const covariance = invertSymmetric(information);
  return covariance ? Math.max(...covariance.map((row, n) => Math.sqrt(row[n] ?? Infinity))) : Infinity;
}
