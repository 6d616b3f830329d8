import { EngineInputError } from "../errors.ts";
import { requireFinite, requireWithin } from "../inputs.ts";
import type { Correlation } from "./correlation.ts";
import { BLOCK, plainDrawing } from "./drawing.ts";
import { blockModel, requireFigures, type BlockModel, type ScalarModel } from "./model.ts";
import type { UncertainQuantity } from "./quantity.ts";
import { seededState } from "./random/generator.ts";
import type { SamplingProgress } from "./sample-uncertainty.ts";
import { sourcesOf } from "./sources.ts";
import { countAbove, meanOf, standardDeviation } from "./summary.ts";

export interface LotInput {
  model: ScalarModel | BlockModel;
  inputs: readonly UncertainQuantity[];
  /** of the parts that are common to all wafers, normal inputs only */
  correlations?: readonly Correlation[];
  /** figure that a wafer must not exceed */
  limit: number;
  /** lots drawn: sets of what is common to all wafers */
  lots: number;
  /** wafers drawn for each lot */
  wafers: number;
  seed: number;
}

/** Share of a lot's wafers beyond a limit, and how well it is known. */
export interface LotShare {
  /** best estimate: mean over what is not known of the common part */
  share: number;
  /** standard uncertainty of a lot's share, from what is common to all its wafers; the noise of drawing is taken out */
  standardUncertainty: number;
  /** 95 % interval of a lot's share; holds the noise of drawing, at most sqrt(0.25/wafers) */
  interval: [number, number];
  /** probability that a lot has no wafer at all beyond the limit among those drawn */
  noneBeyond: number;
  /** standard error of `share`, from the finite number of lots */
  standardError: number;
}

/**
 * The share of wafers beyond a limit, in two layers: for each lot the common parts of all inputs are drawn once, then for each of
 * its wafers what differs between wafers. Tolerances that are common to a lot make all its wafers worse or better together,
 * so they leave the share uncertain; they do not spread the wafers.
 *
 * The variance of the shares drawn holds that of counting, share (1 − share)/wafers on average, which is subtracted without bias.
 * Source: JCGM 101:2008, clause 7, in two layers; own arrangement.
 * @throws EngineInputError naming the input
 */
export function lotShare(i: LotInput): LotShare {
  const run = lotSampling(i);
  for (;;) {
    const step = run.next();
    if (step.done) return step.value;
  }
}

/** `lotShare` in small pieces: yields how far it is, in draws, after every lot. */
export function* lotSampling(i: LotInput): Generator<SamplingProgress, LotShare, void> {
  const { inputs, lots, wafers } = i;
  requireCount("lots", lots, 16);
  requireCount("wafers", wafers, 16);
  const limit = requireFinite("limit", i.limit);
  const width = inputs.length;
  const common = sourcesOf(inputs, i.correlations ?? [], ["common"]);
  const between = sourcesOf(inputs, [], ["between wafers"]);
  const model = blockModel(i.model, width);
  const drawLot = plainDrawing(common, seededState(i.seed));
  // What differs between wafers is drawn about the lot, which takes the place of the best estimates.
  const lot = new Float64Array(width);
  const drawWafers = plainDrawing({ ...between, best: lot }, seededState(i.seed, 1));
  const block = model.block ?? new Float64Array(BLOCK * width);
  const figures = new Float64Array(wafers);
  const out = new Float64Array(BLOCK);
  const shares = new Float64Array(lots);
  for (let n = 0; n < lots; n += 1) {
    drawLot(lot, 1);
    for (let done = 0; done < wafers; done += BLOCK) {
      const rows = Math.min(BLOCK, wafers - done);
      drawWafers(block, rows);
      model.evaluate(block, rows, out);
      requireFigures(out, rows);
      figures.set(out.subarray(0, rows), done);
    }
    shares[n] = countAbove(figures, limit) / wafers;
    yield { done: (n + 1) * wafers, of: lots * wafers };
  }
  return lotShareOf(shares, wafers);
}

function lotShareOf(shares: Float64Array, wafers: number): LotShare {
  const share = meanOf(shares);
  const scatter = standardDeviation(shares);
  // The mean of p (1 − p)/(wafers − 1) over the drawn shares is an unbiased estimate of the counting's variance.
  const counting = meanOf(shares.map((p) => (p * (1 - p)) / (wafers - 1)));
  const sorted = shares.slice().sort();
  const at = (p: number) => sorted[Math.min(shares.length - 1, Math.round(p * shares.length))] ?? 0;
  return {
    share,
    standardUncertainty: Math.sqrt(Math.max(0, scatter * scatter - counting)),
    interval: [at(0.025), at(0.975)],
    noneBeyond: meanOf(shares.map((p) => (p === 0 ? 1 : 0))),
    standardError: scatter / Math.sqrt(shares.length),
  };
}

function requireCount(field: string, value: number, fewest: number): void {
  if (!Number.isInteger(value)) throw new EngineInputError(field, "is not a whole number", "a whole number");
  requireWithin(field, value, fewest, 1e6, "1");
}
