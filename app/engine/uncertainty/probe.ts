import { EngineInputError } from "../errors.ts";
import { scalarModel, type BlockModel, type ScalarModel } from "./model.ts";
import { reach, spreadUncertainty, type UncertainQuantity } from "./quantity.ts";
import { rootSumOfSquares } from "./random/elementary.ts";

/** Departure from a straight line, in standard uncertainties of the figure, from which on the model counts as bent. */
const STRAIGHT_WITHIN = 0.1;

/** Standard uncertainty of an input with both its parts. */
export function wholeUncertainty(input: UncertainQuantity): number {
  return rootSumOfSquares([spreadUncertainty(input), input.betweenWafers ? spreadUncertainty(input.betweenWafers) : 0]);
}

/** A model looked at around the best estimates of its inputs, one input moved at a time. */
export function probeOf(of: ScalarModel | BlockModel, inputs: readonly UncertainQuantity[]) {
  const model = scalarModel(of);
  const row = Float64Array.from(inputs, ({ value }) => value);
  const atBest = figure(model, row);
  const moved = (n: number, by: number): number | null => {
    const best = row[n] ?? 0;
    row[n] = best + by;
    try {
      return figure(model, row);
    } catch (error) {
      if (error instanceof EngineInputError) return null;
      throw error;
    } finally {
      row[n] = best;
    }
  };
  /** Half the difference of the figure at `by` up and down, or the difference to one side where the other cannot be computed. */
  const half = (n: number, by: number): number => {
    if (by === 0) return 0;
    const [up, down] = [moved(n, by), moved(n, -by)];
    if (up === null) return down === null ? 0 : atBest - down;
    return down === null ? up - atBest : (up - down) / 2;
  };
  return {
    atBest,
    half,
    /**
     * Largest distance of the figure from the straight line through the best estimate, at the ends of the input's reach. `slope`
     * is that over one standard uncertainty of the whole input.
     */
    departure(n: number, input: UncertainQuantity, slope: number): number {
      const by = Math.hypot(reach(input), input.betweenWafers ? reach(input.betweenWafers) : 0);
      if (by === 0) return 0;
      const straight = slope * by;
      const [up, down] = [moved(n, by), moved(n, -by)];
      // A side that cannot be computed is as far from a straight line as can be told: by all of it.
      const off = (figureThere: number | null, expected: number) =>
        figureThere === null ? Math.abs(straight) : Math.abs(figureThere - expected);
      return Math.max(off(up, atBest + straight), off(down, atBest - straight));
    },
  };
}

/** Whether a departure from a straight line, in standard uncertainties of the figure, is one that counts. */
export function bends(departure: number): boolean {
  return departure > STRAIGHT_WITHIN;
}

function figure(model: ScalarModel, row: Float64Array): number {
  const value = model(row);
  if (!Number.isFinite(value)) throw new EngineInputError("model", "gives no finite number for these inputs");
  return value;
}
