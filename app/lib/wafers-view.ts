import type { FlowInput } from "#app/engine/flow/model.ts";
import type { Edges, SampledStep, SampledWarp, SampledWarps, ShareBeyond } from "#app/engine/flow/sample-warps.ts";
import { formatNumber } from "#app/engine/units/format-number.ts";
import { celsius, micrometres } from "./assessment-figure.ts";

/** How the warp of the wafers drawn is spread at one moment of a step. */
export interface WafersRow {
  key: string;
  step: number;
  title: string;
  /** 'as it leaves', 'free at 250 °C' */
  when: string;
  planned: string;
  drawn: string;
  firstOrder: string;
  /** shares beyond the limits of its tool; empty where it has none, or where another row of the step says them */
  beyond: { limit: string; share: string; some: boolean }[];
}

export interface WafersView {
  draws: number;
  inputs: number;
  /** largest standard error of the end of a band; null without a band */
  ends: string | null;
  rows: WafersRow[];
  /** steps without a shape of their own */
  without: number[];
}

/** What the wafers drawn say, in words and units. */
export function wafersView({ draws, inputs, steps }: SampledWarps, { steps: planned }: FlowInput): WafersView {
  const errors = steps.flatMap(({ warps }) => warps.flatMap(({ standardErrors }) => standardErrors));
  return {
    draws,
    inputs,
    ends: errors.length > 0 ? micrometres(Math.max(...errors)) : null,
    rows: steps.flatMap((step, index) => rowsOf(step, planned[index])),
    without: steps.flatMap(({ step, warps }) => (warps.length === 0 ? [step] : [])),
  };
}

function rowsOf({ step, warps, beyond }: SampledStep, planned: FlowInput["steps"][number] | undefined): WafersRow[] {
  return warps.map((warp, at) => ({
    key: `${step} ${warp.moment}`,
    step,
    title: planned?.title ?? "",
    when: warp.moment === "atRoom" ? "as it leaves" : `free at ${celsius(planned?.peakTemperature ?? 0)}`,
    planned: signed(warp.nominal),
    drawn: band(warp.band),
    firstOrder: band(warp.firstOrder),
    beyond: at === 0 ? (["up", "down"] as const).flatMap((edges) => limitOf(beyond, edges)) : [],
  }));
}

const signed = (value: number) => `edges ${value < 0 ? "down" : "up"} ${micrometres(Math.abs(value))}`;

/** 'edges up 82 to 104 µm', from the smaller to the larger; from one way to the other where the band holds flat. */
function band([low, high]: SampledWarp["band"]): string {
  if (low < 0 && high > 0) return `${signed(low)} to ${signed(high)}`;
  const [near, far] = [Math.min(Math.abs(low), Math.abs(high)), Math.max(Math.abs(low), Math.abs(high))];
  const from = formatNumber(near * 1e6, { decimals: far < 1e-4 ? 1 : 0, trim: true });
  return `edges ${low < 0 ? "down" : "up"} ${from} to ${micrometres(far)}`;
}

/** The moment at which most wafers are beyond a limit. */
function limitOf(beyond: readonly ShareBeyond[], edges: Edges): WafersRow["beyond"] {
  const [most] = beyond
    .filter((each) => each.edges === edges)
    .toSorted((a, b) => b.chance.probability - a.chance.probability);
  if (!most) return [];
  const { probability } = most.chance;
  const some = probability > 0;
  const share = some ? `${probability === 1 ? "all" : shareText(most)} ${most.when}` : "none";
  return [{ limit: `${edges} ${micrometres(most.limit)}`, share, some }];
}

/** '3.2 ± 0.1 %'; to a hundredth near nothing and near all. */
function shareText({ chance: { probability, standardError } }: ShareBeyond): string {
  const decimals = probability < 0.01 || probability > 0.99 ? 2 : 1;
  const percent = (share: number) => formatNumber(100 * share, { decimals });
  return `${percent(probability)}\u00A0±\u00A0${percent(standardError)}\u00A0%`;
}
