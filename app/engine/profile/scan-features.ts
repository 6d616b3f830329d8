import { medianInPlace } from "./median.ts";

/** A stretch without points between two neighbours, m. */
export interface ScanGap {
  from: number;
  to: number;
}

/** Points left out that lie side by side. */
export interface RejectedRun {
  /** positions of the first and last of them, m */
  from: number;
  to: number;
  count: number;
  /** mean height over the fitted curve, m */
  height: number;
  /** `step` when it is longer than a fiftieth of the scan */
  kind: "spike" | "step";
}

/** Spacing over the usual one, and share of the scan, from which on a stretch without points is a gap. */
const GAP_SPACINGS = 20;
const GAP_SHARE = 0.005;
const STEP_SHARE = 0.02;
/** Points between two that were left out that do not end a run. */
const BRIDGED = 2;
/** Runs that are listed. */
const MOST_RUNS = 1000;
const SAMPLED = 16384;

/** Stretches of an ascending scan that hold no points though the rest is filled, such as a notch or rows that were lost. */
export function gapsIn(x: Float64Array): ScanGap[] {
  const count = x.length;
  const stride = Math.max(1, Math.floor(count / SAMPLED));
  const spacings = new Float64Array(Math.ceil(count / stride) + 1);
  let sampled = 0;
  for (let n = 0; n + 1 < count; n += stride) {
    spacings[sampled] = (x[n + 1] ?? 0) - (x[n] ?? 0);
    sampled += 1;
  }
  if (sampled === 0) return [];
  const length = (x[count - 1] ?? 0) - (x[0] ?? 0);
  const least = Math.max(GAP_SPACINGS * medianInPlace(spacings, sampled), GAP_SHARE * length);
  const gaps: ScanGap[] = [];
  for (let n = 0; n + 1 < count && gaps.length < MOST_RUNS; n += 1) {
    const [from, to] = [x[n] ?? 0, x[n + 1] ?? 0];
    if (to - from > least) gaps.push({ from, to });
  }
  return gaps;
}

/** Runs of points that a robust fit left out of an ascending scan. `over` is the height of a point over the fitted curve. */
export function rejectedRuns(x: Float64Array, keep: Uint8Array, over: (index: number) => number): RejectedRun[] {
  const runs: RejectedRun[] = [];
  const length = (x[x.length - 1] ?? 0) - (x[0] ?? 0);
  let run: RejectedRun | null = null;
  let since = 0;
  for (let n = 0; n < x.length && runs.length < MOST_RUNS; n += 1) {
    if (keep[n] === 1) {
      since += 1;
      continue;
    }
    if (!run || since > BRIDGED) {
      run = { from: x[n] ?? 0, to: x[n] ?? 0, count: 0, height: 0, kind: "spike" };
      runs.push(run);
    }
    since = 0;
    run.to = x[n] ?? 0;
    run.count += 1;
    run.height += over(n);
    if (run.to - run.from > STEP_SHARE * length) run.kind = "step";
  }
  return runs.map((r) => ({ ...r, height: r.height / r.count }));
}
