import type { BlockModel, ScalarModel } from "./model.ts";
import { bends, probeOf, wholeUncertainty } from "./probe.ts";
import type { UncertainQuantity } from "./quantity.ts";

/** How far a figure is spread, without saying by which input. */
export interface FirstOrderSpread {
  /** the figure at the best estimates */
  value: number;
  /** in the unit of the figure */
  standardUncertainty: number;
  /** false when the figure bends so much over the inputs' uncertainty that a normal distribution about `value` misleads */
  linear: boolean;
}

/**
 * Value, standard uncertainty and linearity of `firstOrderUncertainty` for inputs that are common to all wafers and independent
 * of each other, to the last digit, without its budget: for an answer that follows every keystroke.
 * Source: JCGM 100:2008, 5.1.2 and 5.1.3.
 * @throws EngineInputError when the model refuses the best estimates
 */
export function firstOrderSpread(
  model: ScalarModel | BlockModel,
  inputs: readonly UncertainQuantity[],
): FirstOrderSpread {
  const probe = probeOf(model, inputs);
  const uncertainties = inputs.map(wholeUncertainty);
  const contributions = uncertainties.map((u, n) => probe.half(n, u));
  const total = Math.sqrt(contributions.reduce((sum, contribution) => sum + contribution ** 2, 0));
  const bent = inputs.some((input, n) => {
    const u = uncertainties[n] ?? 0;
    const slope = u === 0 ? 0 : (contributions[n] ?? 0) / u;
    return total !== 0 && bends(probe.departure(n, input, slope) / total);
  });
  return { value: probe.atBest, standardUncertainty: total, linear: !bent };
}
