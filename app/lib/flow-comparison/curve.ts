import type { ComparedCurve } from "#app/schemas/comparison.ts";
import { LEAST_DRAWN, shortened } from "../stack-chart.ts";
import type { ThinnedWarp, Thinning, ThinningStep } from "./thinning.ts";

interface Range {
  from: number;
  to: number;
}

interface Sample extends ThinnedWarp {
  x: number;
}

/** Points of the curve of a flow, over all its steps that thin. */
const POINTS = 120;
/** Fewest within one step. */
const LEAST_POINTS = 5;
/** How often the stretch between two points is halved for the place where it begins to curl. */
const HALVINGS = 30;

/** The curve of a flow over silicon thickness, within a range, m: upright where steps between two thinnings change the wafer. */
export function thinningCurve(
  { letter, name }: { letter: string; name: string },
  thinning: Thinning,
  range: Range,
): ComparedCurve {
  const samples = thinning.steps.toReversed().flatMap((step) => samplesOf(thinning, step, range));
  const drawn = samples.filter(isDrawn);
  const curled = curledStretches(samples);
  const own = thinning.range.from >= range.from && thinning.range.from <= range.to ? drawn[0] : undefined;
  const top = curled.at(-1)?.to;
  const onset = drawn.findLast(({ x }) => x === top);
  return {
    letter,
    label: `${letter} ${shortened(name)}`,
    points: drawn.map(({ x, warp }) => ({ x, y: warp })),
    own: own && own.x === thinning.range.from ? { x: own.x, y: own.warp } : null,
    onset: onset ? { x: onset.x, y: onset.warp } : null,
    curled,
    gaps: gapsOf(samples),
  };
}

const isDrawn = ({ warp, rolledUp }: Sample) => !rolledUp && warp >= LEAST_DRAWN;

/** One step thin to thick, with the place where it begins to curl as a point of its own. */
function samplesOf(thinning: Thinning, step: ThinningStep, range: Range): Sample[] {
  const [from, to] = [Math.max(step.from, range.from), Math.min(step.to, range.to)];
  if (from > to) return [];
  const whole = Math.log(thinning.range.to / thinning.range.from);
  const count = Math.max(LEAST_POINTS, Math.round((POINTS * Math.log(to / from)) / whole));
  const sample = (x: number): Sample => ({ x, ...thinning.within(step, x) });
  const found = Array.from({ length: count }, (_, n) =>
    sample(n === 0 ? from : n === count - 1 ? to : from * (to / from) ** (n / (count - 1))),
  );
  return found.flatMap((each, n) => {
    const next = found[n + 1];
    if (!next || next.curled === each.curled) return [each];
    let [low, high] = [each, next];
    for (let halved = 0; halved < HALVINGS; halved += 1) {
      const middle = sample(Math.sqrt(low.x * high.x));
      if (middle.curled === each.curled) low = middle;
      else high = middle;
    }
    return [each, each.curled ? low : high];
  });
}

/** Where it is curled, thin to thick. */
function curledStretches(samples: readonly Sample[]): ComparedCurve["curled"] {
  const stretches: { from: number; to: number }[] = [];
  samples.forEach(({ x, curled }, n) => {
    if (!curled) return;
    const last = stretches.at(-1);
    if (last && samples[n - 1]?.curled) last.to = x;
    else stretches.push({ from: x, to: x });
  });
  return stretches.filter(({ from, to }) => to > from);
}

/** Between neighbours of which something was left out. */
function gapsOf(samples: readonly Sample[]): NonNullable<ComparedCurve["gaps"]> {
  const gaps: { from: number; to: number }[] = [];
  let from: number | null = null;
  let left = false;
  for (const sample of samples) {
    if (!isDrawn(sample)) {
      left = true;
      continue;
    }
    if (left && from !== null) gaps.push({ from, to: sample.x });
    [from, left] = [sample.x, false];
  }
  return gaps;
}
