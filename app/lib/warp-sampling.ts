import type { StackInput } from "#app/engine/stack/model.ts";
import { warpModel } from "#app/engine/stack/warp-uncertainty.ts";
import { sampling, type SamplingProgress } from "#app/engine/uncertainty/sample-uncertainty.ts";

/** Wafers drawn for the spread of a warp: enough for a share to a tenth of a per cent. */
const DRAWS = 2 ** 15;
/** One seed for all, so that the same stack gives the same figures on every machine. */
const SEED = 1;
/** How often progress is told, in draws. */
const TOLD_EVERY = 512;

/** What a spread is asked of: a stack with tolerances, and the warp that must not be exceeded, m. */
export interface WarpQuestion {
  stack: StackInput;
  limit: number;
}

/** How the warp of wafers with this stack is spread, m. */
export interface WarpSpread {
  draws: number;
  /** inputs that have a tolerance */
  inputs: number;
  mean: number;
  standardUncertainty: number;
  /** 95 % of the wafers */
  interval: [number, number];
  limit: number;
  /** share beyond the limit, with the standard error that the finite number of draws leaves it */
  beyond: { probability: number; standardError: number };
}

/**
 * Draws wafers within the tolerances of a stack and tells how their warp is spread. Yields how far it is; leaving it early is
 * safe, so a worker can stop it.
 * @throws EngineInputError naming the input
 */
export function* warpSampling({ stack, limit }: WarpQuestion): Generator<SamplingProgress, WarpSpread, void> {
  const { inputs, model } = warpModel(stack);
  const run = sampling({ model, inputs, draws: DRAWS, seed: SEED, method: "lattice" });
  for (;;) {
    const step = run.next();
    if (step.done) {
      const { draws, mean, standardUncertainty, interval, chanceAbove } = step.value;
      return { draws, inputs: inputs.length, mean, standardUncertainty, interval, limit, beyond: chanceAbove(limit) };
    }
    if (step.value.done % TOLD_EVERY === 0) yield step.value;
  }
}
