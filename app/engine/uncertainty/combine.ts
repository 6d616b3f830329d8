import { requireFinite, requireWithin } from "../inputs.ts";

/** One input of a measured or calculated figure. */
export interface UncertainInput {
  /** Its name, as a reader should see it. */
  input: string;
  /** Partial derivative of the figure with respect to the input, in their units. */
  sensitivity: number;
  /** Standard uncertainty of the input, in its unit, not negative. */
  standardUncertainty: number;
}

export interface CombinedUncertainty {
  /** In the unit of the figure. */
  standardUncertainty: number;
  /** Share of each input in the unit of the figure, in the order given; their root sum of squares is the total. */
  budget: { input: string; contribution: number }[];
}

/**
 * Combined standard uncertainty of a figure whose inputs are independent, by the law of propagation of first order:
 * u² = sum of (∂f/∂x_i)² u²(x_i). Valid while the figure is close to linear over the uncertainty of each input.
 * Source: JCGM 100:2008, 5.1.2, equation (10).
 */
export function combineUncertainty(inputs: readonly UncertainInput[]): CombinedUncertainty {
  const budget = inputs.map(({ input, sensitivity, standardUncertainty }) => {
    const size = requireWithin(`${input}.standardUncertainty`, standardUncertainty, 0, Number.MAX_VALUE, "1");
    return { input, contribution: Math.abs(requireFinite(`${input}.sensitivity`, sensitivity)) * size };
  });
  return { standardUncertainty: Math.hypot(...budget.map(({ contribution }) => contribution)), budget };
}
