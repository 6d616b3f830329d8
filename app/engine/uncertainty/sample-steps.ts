import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";
import type { Correlation } from "./correlation.ts";
import { BLOCK, plainDrawing } from "./drawing.ts";
import { blockModel, requireFigures, type BlockModel, type ScalarModel } from "./model.ts";
import type { UncertainQuantity } from "./quantity.ts";
import { seededState } from "./random/generator.ts";
import type { SamplingProgress } from "./sample-uncertainty.ts";
import { sourcesOf } from "./sources.ts";
import { meanOf, standardDeviation, summarise, type SampledUncertainty } from "./summary.ts";

export interface StepsSamplingInput {
  /** a figure per step, each a function of all the inputs or of those that `uses` names by their places, in that order */
  steps: readonly { model: ScalarModel | BlockModel; uses?: readonly number[] }[];
  /** the inputs of all steps together */
  inputs: readonly UncertainQuantity[];
  correlations?: readonly Correlation[];
  /** draws of the inputs, each carried through every step */
  draws: number;
  seed: number;
}

/**
 * The figures of several steps from the same draws, so that what the steps share moves them together: the same film is the same
 * film at every step. Independent draws. Yields how far it is after every 128 draws of all steps, so that a worker can report
 * progress and stop.
 * @throws EngineInputError naming the input
 */
export function* stepsSampling(i: StepsSamplingInput): Generator<SamplingProgress, SampledUncertainty[], void> {
  const { steps, inputs, draws } = i;
  if (!Number.isInteger(draws)) throw new EngineInputError("draws", "is not a whole number", "a whole number");
  requireWithin("draws", draws, 64, 2 ** 25, "1");
  const width = inputs.length;
  const draw = plainDrawing(sourcesOf(inputs, i.correlations ?? []), seededState(i.seed));
  const tasks = steps.map(({ model, uses }, n) => ({
    ...taskOf(model, uses, width, `steps[${n}].uses`),
    figures: new Float64Array(draws),
  }));
  const block = new Float64Array(BLOCK * width);
  const room = new Float64Array(BLOCK * Math.max(0, ...tasks.map(({ model }) => model.inputs)));
  const out = new Float64Array(BLOCK);
  for (let done = 0; done < draws; done += BLOCK) {
    const rows = Math.min(BLOCK, draws - done);
    draw(block, rows);
    for (const { model, places, figures } of tasks) {
      const picked = model.block ?? room;
      if (places) pick(block, width, places, rows, picked);
      model.evaluate(places ? picked : block, rows, out);
      requireFigures(out, rows);
      figures.set(rows === BLOCK ? out : out.subarray(0, rows), done);
    }
    yield { done: done + rows, of: draws };
  }
  return tasks.map(({ figures }) =>
    summarise({
      method: "plain",
      figures,
      ends: Array.from({ length: 32 }, (_, n) => Math.floor((draws * (n + 1)) / 32)),
      mean: meanOf(figures),
      standardErrorOfMean: standardDeviation(figures) / Math.sqrt(draws),
    }),
  );
}

/** `stepsSampling` run to its end. */
export function sampleSteps(i: StepsSamplingInput): SampledUncertainty[] {
  const run = stepsSampling(i);
  for (;;) {
    const step = run.next();
    if (step.done) return step.value;
  }
}

function taskOf(
  model: ScalarModel | BlockModel,
  uses: readonly number[] | undefined,
  width: number,
  field: string,
): { model: BlockModel; places: Int32Array | null } {
  if (!uses) return { model: blockModel(model, width), places: null };
  for (const place of uses) {
    if (!Number.isInteger(place) || place < 0 || place >= width)
      throw new EngineInputError(field, `${place} is the place of no input`, `0 to ${width - 1}`);
  }
  return { model: blockModel(model, uses.length), places: Int32Array.from(uses) };
}

/** The inputs that a step uses, row after row. */
function pick(block: Float64Array, width: number, places: Int32Array, rows: number, picked: Float64Array): void {
  const count = places.length;
  for (let row = 0; row < rows; row += 1) {
    for (let n = 0; n < count; n += 1) picked[row * count + n] = block[row * width + (places[n] ?? 0)] ?? 0;
  }
}
