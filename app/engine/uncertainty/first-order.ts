import { combineUncertainty } from "./combine.ts";
import { correlationMatrix, type Correlation } from "./correlation.ts";
import type { BlockModel, ScalarModel } from "./model.ts";
import { bends, probeOf, wholeUncertainty } from "./probe.ts";
import { checkQuantities, spreadUncertainty, type Spread, type UncertainQuantity } from "./quantity.ts";

/** One input's line of a budget. */
export interface BudgetLine {
  input: string;
  /** slope of the figure, its unit per unit of the input, over one standard uncertainty to either side */
  sensitivity: number;
  /** sensitivity times standard uncertainty, in the unit of the figure, with its sign */
  contribution: number;
}

export interface Budget {
  /** in the unit of the figure */
  standardUncertainty: number;
  /** largest first; inputs that are exact or do not move the figure are left out */
  lines: BudgetLine[];
}

export interface FirstOrderUncertainty extends Budget {
  /** the figure at the best estimates */
  value: number;
  /** what is common to all wafers alone */
  common: Budget;
  /** what differs from wafer to wafer alone */
  betweenWafers: Budget;
  /** false when the figure bends so much over the inputs' uncertainty that a normal distribution about `value` misleads */
  linear: boolean;
  /** inputs over which it bends, and by how much of the figure's standard uncertainty, worst first */
  departures: { input: string; departure: number }[];
  /** the same in words */
  remark: string;
}

export interface FirstOrderInput {
  model: ScalarModel | BlockModel;
  inputs: readonly UncertainQuantity[];
  /** of the parts that are common to all wafers, normal inputs only */
  correlations?: readonly Correlation[];
}

/**
 * Uncertainty of a figure by the law of propagation of first order, with the share of every input: u² = sum of c_i u_i c_j u_j r_ij,
 * each c_i u_i half the difference of the figure one standard uncertainty up and down (JCGM 100:2008, 5.1.3 note 2), or the
 * difference to one side where the other cannot be computed. Spread between wafers is kept apart from what is common to all.
 *
 * Valid while the figure is straight over two standard uncertainties: each input is also moved that far (a bounded one at most
 * to its ends), and the departure from the straight line is reported. Inputs that bend the figure only together are not seen
 * by that; Monte Carlo sees them. Source: JCGM 100:2008, 5.1.2, 5.1.3 and 5.2.2.
 * @throws EngineInputError when an input is out of range or the model refuses the best estimates
 */
export function firstOrderUncertainty(i: FirstOrderInput): FirstOrderUncertainty {
  const { inputs, correlations = [] } = i;
  checkQuantities(inputs);
  const matrix = correlationMatrix(inputs, correlations);
  const probe = probeOf(i.model, inputs);
  const value = probe.atBest;
  const common = inputs.map((input, n) => line(probe, n, input.name, input));
  const wafers = inputs.map((input, n) => line(probe, n, input.name, input.betweenWafers ?? { distribution: "exact" }));
  const total = Math.hypot(combined(common, matrix), combined(wafers, null));
  const departures = inputs
    .map((input, n) => ({
      input: input.name,
      departure: total === 0 ? 0 : probe.departure(n, input, slope(probe, n, input)) / total,
    }))
    .filter(({ departure }) => bends(departure))
    .sort((a, b) => b.departure - a.departure);
  return {
    value,
    standardUncertainty: total,
    lines: budgetLines(inputs.map((_, n) => together(common[n], wafers[n]))),
    common: { standardUncertainty: combined(common, matrix), lines: budgetLines(common) },
    betweenWafers: { standardUncertainty: combined(wafers, null), lines: budgetLines(wafers) },
    linear: departures.length === 0,
    departures,
    remark: inWords(departures),
  };
}

/** Slopes of a model at its best estimates, one per input, each over one standard uncertainty of the whole input. */
export function slopes(model: ScalarModel | BlockModel, inputs: readonly UncertainQuantity[]): Float64Array {
  const probe = probeOf(model, inputs);
  return Float64Array.from(inputs, (input, n) => slope(probe, n, input));
}

type Probe = ReturnType<typeof probeOf>;

function slope(probe: Probe, n: number, input: UncertainQuantity): number {
  const u = wholeUncertainty(input);
  return u === 0 ? 0 : probe.half(n, u) / u;
}

function line(probe: Probe, n: number, input: string, spread: Spread): BudgetLine {
  const u = spreadUncertainty(spread);
  const contribution = probe.half(n, u);
  return { input, sensitivity: u === 0 ? 0 : contribution / u, contribution };
}

function combined(lines: readonly BudgetLine[], matrix: Float64Array | null): number {
  const parts = lines.map(({ input, contribution }) => ({ input, sensitivity: contribution, standardUncertainty: 1 }));
  if (matrix === null) return combineUncertainty(parts).standardUncertainty;
  let square = 0;
  lines.forEach((a, row) => {
    lines.forEach((b, column) => {
      square += a.contribution * b.contribution * (matrix[row * lines.length + column] ?? 0);
    });
  });
  return Math.sqrt(Math.max(0, square));
}

function together(common?: BudgetLine, wafers?: BudgetLine): BudgetLine {
  const [a, b] = [common?.contribution ?? 0, wafers?.contribution ?? 0];
  const leading = Math.abs(a) >= Math.abs(b) ? common : wafers;
  return {
    input: leading?.input ?? "",
    sensitivity: leading?.sensitivity ?? 0,
    contribution: Math.hypot(a, b) * ((leading?.contribution ?? 0) < 0 ? -1 : 1),
  };
}

function budgetLines(lines: readonly BudgetLine[]): BudgetLine[] {
  return lines
    .filter(({ contribution }) => contribution !== 0)
    .toSorted((a, b) => Math.abs(b.contribution) - Math.abs(a.contribution));
}

function inWords(departures: readonly { input: string; departure: number }[]): string {
  const [worst, ...others] = departures;
  if (!worst) return "The figure is close to linear over the uncertainty of each input.";
  const share = Math.round(worst.departure * 100);
  const also = others.length === 0 ? "" : ` and ${others.length} more`;
  return `The figure is not linear over the uncertainty of ${worst.input}${also}: it departs from a straight line by ${share} % of its standard uncertainty. Sample it instead.`;
}
