import { medianInPlace } from "./median.ts";

/**
 * Tuning constant of the bisquare: a point farther off than this many standard deviations of the scatter counts nothing. Gives
 * 95 % of the efficiency of least squares on normal scatter. Source: Beaton and Tukey 1974; Holland and Welsch 1977.
 */
export const BISQUARE = 4.685;

/** Standard deviation of a normal distribution over its median absolute deviation. */
const NORMAL_OVER_MEDIAN = 1.4826;
/** The same over its mean absolute deviation. */
const NORMAL_OVER_MEAN = 1.2533;
/** Stretches of the scan whose medians start the fit; all their triples are tried. */
const STRETCHES = 20;
/** A scan with twice as many points or more is begun on about so many of them, evenly spread, and settled on all. */
const SAMPLED = 65536;
const MOST_ROUNDS = 50;
/** Rounds in which the scatter is measured anew; then it stays, so that the weights settle. Fewer where a sample has settled before. */
const SCALE_ROUNDS = 4;
const SCALE_ROUNDS_AFTER_SAMPLE = 2;
/** A parabola that moves by less than this share of how far off a point may lie leaves every point on its side. */
const SETTLED = 1e-5;

/** c_0 + c_1 t + c_2 t² */
type Parabola = readonly [number, number, number];

/**
 * Which points follow one parabola: 1 for those, 0 for spikes, steps and other points farther off than 4.685 times the scatter of
 * the rest. `t` ascends from −1 to 1. Linear time.
 *
 * The start is the parabola through the medians of three of 20 stretches that has the least median of squared deviations
 * (Rousseeuw 1984) over all stretches: it stands up to nearly half of them being wrong, at an end too. From there
 * iterated least squares with Tukey's bisquare weights, the scatter by the median absolute deviation.
 * A step is told when fewer than half of the points lie beyond it.
 */
export function pointsOnParabola(t: Float64Array, z: Float64Array): Uint8Array {
  const { parabola, limit } = settledOnAll(t, z);
  const keep = new Uint8Array(t.length);
  for (let n = 0; n < t.length; n += 1) keep[n] = Math.abs(off(parabola, t[n] ?? 0, z[n] ?? 0)) <= limit ? 1 : 0;
  return keep;
}

/** The parabola that most points follow. */
function settledOnAll(t: Float64Array, z: Float64Array): Settled {
  const stride = Math.floor(t.length / SAMPLED);
  if (stride < 2) return settled(t, z, leastMedian(t, z), SCALE_ROUNDS);
  const [sampleT, sampleZ] = [thinned(t, stride), thinned(z, stride)];
  const start = settled(sampleT, sampleZ, leastMedian(sampleT, sampleZ), SCALE_ROUNDS);
  return settled(t, z, start.parabola, SCALE_ROUNDS_AFTER_SAMPLE);
}

function thinned(values: Float64Array, stride: number): Float64Array {
  const out = new Float64Array(Math.ceil(values.length / stride));
  for (let n = 0; n < out.length; n += 1) out[n] = values[n * stride] ?? 0;
  return out;
}

interface Settled {
  parabola: Parabola;
  /** how far off a point may lie, m */
  limit: number;
}

function settled(t: Float64Array, z: Float64Array, start: Parabola, scaleRounds: number): Settled {
  const room = new Float64Array(t.length);
  // A perfect parabola leaves rounding only, which is no scatter to judge points by.
  let largest = 0;
  for (let n = 0; n < z.length; n += 1) largest = Math.max(largest, Math.abs(z[n] ?? 0));
  const rounding = 1e-12 * largest;
  let parabola = start;
  let limit = 0;
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    if (round < scaleRounds) limit = Math.max(BISQUARE * scatterAbout(parabola, t, z, room), rounding);
    const next = weightedRound(parabola, t, z, limit);
    const moved = next === null ? 0 : Math.max(...next.map((value, n) => Math.abs(value - (parabola[n] ?? 0))));
    if (next !== null) parabola = next;
    if (round >= scaleRounds && moved <= SETTLED * limit) break;
  }
  return { parabola, limit };
}

function off([c0, c1, c2]: Parabola, t: number, z: number): number {
  return z - (c0 + (c1 + c2 * t) * t);
}

/** Standard deviation of the scatter about a parabola, by the median absolute deviation. */
function scatterAbout(parabola: Parabola, t: Float64Array, z: Float64Array, room: Float64Array): number {
  const count = t.length;
  let sum = 0;
  for (let n = 0; n < count; n += 1) {
    const size = Math.abs(off(parabola, t[n] ?? 0, z[n] ?? 0));
    room[n] = size;
    sum += size;
  }
  const median = medianInPlace(room, count);
  // Heights in coarse steps may have more than half of the points exactly on the parabola.
  return median > 0 ? NORMAL_OVER_MEDIAN * median : (NORMAL_OVER_MEAN * sum) / count;
}

/** One round of least squares with bisquare weights, about the parabola at hand; null when too few points count. */
function weightedRound(parabola: Parabola, t: Float64Array, z: Float64Array, limit: number): Parabola | null {
  if (limit === 0) return null;
  let [s0, s1, s2, s3, s4] = [0, 0, 0, 0, 0];
  let [r0, r1, r2] = [0, 0, 0];
  for (let n = 0; n < t.length; n += 1) {
    const at = t[n] ?? 0;
    const left = off(parabola, at, z[n] ?? 0);
    const share = left / limit;
    const rest = 1 - share * share;
    if (rest <= 0) continue;
    const weight = rest * rest;
    const square = at * at;
    s0 += weight;
    s1 += weight * at;
    s2 += weight * square;
    s3 += weight * square * at;
    s4 += weight * square * square;
    r0 += weight * left;
    r1 += weight * left * at;
    r2 += weight * left * square;
  }
  const step = solveThree(s0, s1, s2, s3, s4, r0, r1, r2);
  return step && [parabola[0] + step[0], parabola[1] + step[1], parabola[2] + step[2]];
}

/** Normal equations of a parabola with the moments s of its weights, by Cramer's rule. */
function solveThree(
  s0: number,
  s1: number,
  s2: number,
  s3: number,
  s4: number,
  r0: number,
  r1: number,
  r2: number,
): Parabola | null {
  const [a, b, c] = [s2 * s4 - s3 * s3, s2 * s3 - s1 * s4, s1 * s3 - s2 * s2];
  const [d, e, f] = [s0 * s4 - s2 * s2, s1 * s2 - s0 * s3, s0 * s2 - s1 * s1];
  const determinant = s0 * a + s1 * b + s2 * c;
  if (!(determinant > 1e-9 * s0 * s2 * s4)) return null;
  return [
    (a * r0 + b * r1 + c * r2) / determinant,
    (b * r0 + d * r1 + e * r2) / determinant,
    (c * r0 + e * r1 + f * r2) / determinant,
  ];
}

/** The parabola through three stretches' medians from which the median of the stretches' deviations is least. */
function leastMedian(t: Float64Array, z: Float64Array): Parabola {
  const count = Math.min(STRETCHES, t.length);
  const at = new Float64Array(count);
  const height = new Float64Array(count);
  const room = new Float64Array(Math.ceil(t.length / count) + 1);
  for (let n = 0; n < count; n += 1) {
    const from = Math.floor((n * t.length) / count);
    const to = Math.floor(((n + 1) * t.length) / count);
    at[n] = medianOfRange(t, from, to, room);
    height[n] = medianOfRange(z, from, to, room);
  }
  const sizes = new Float64Array(count);
  let best: Parabola = [0, 0, 0];
  let least = Number.POSITIVE_INFINITY;
  for (let i = 0; i < count; i += 1)
    for (let j = i + 1; j < count; j += 1)
      for (let k = j + 1; k < count; k += 1) {
        const parabola = through(at, height, i, j, k);
        if (!parabola) continue;
        let nearer = 0;
        for (let n = 0; n < count; n += 1) {
          const size = Math.abs(off(parabola, at[n] ?? 0, height[n] ?? 0));
          sizes[n] = size;
          if (size < least) nearer += 1;
        }
        // The median can only be less when half of the deviations are.
        if (2 * nearer < count) continue;
        const median = medianInPlace(sizes, count);
        if (median < least) {
          least = median;
          best = parabola;
        }
      }
  return best;
}

function medianOfRange(values: Float64Array, from: number, to: number, room: Float64Array): number {
  for (let n = from; n < to; n += 1) room[n - from] = values[n] ?? 0;
  return medianInPlace(room, to - from);
}

/** Parabola through three points by divided differences; null when two share a position. */
function through(at: Float64Array, height: Float64Array, i: number, j: number, k: number): Parabola | null {
  const [t0, t1, t2] = [at[i] ?? 0, at[j] ?? 0, at[k] ?? 0];
  if (t0 === t1 || t1 === t2) return null;
  const first = ((height[j] ?? 0) - (height[i] ?? 0)) / (t1 - t0);
  const second = ((height[k] ?? 0) - (height[j] ?? 0)) / (t2 - t1);
  const c2 = (second - first) / (t2 - t0);
  return [(height[i] ?? 0) - first * t0 + c2 * t0 * t1, first - c2 * (t0 + t1), c2];
}
