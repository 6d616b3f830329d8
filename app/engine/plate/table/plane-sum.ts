import { at, indexAt } from "./elements.ts";
import type { PlaneSum } from "./chebyshev.ts";

/** Value and derivatives of a function of x and y. */
export interface Jet {
  value: number;
  x: number;
  y: number;
  xx: number;
  xy: number;
  yy: number;
}

const MOST = 64;
const T = new Float64Array(MOST);
const dT = new Float64Array(MOST);
const ddT = new Float64Array(MOST);

/** Fills T and its derivatives up to `count` terms at `y`; one set for all, so that nothing is allocated. */
function fill(count: number, y: number): void {
  T[0] = 1;
  T[1] = y;
  dT[0] = 0;
  dT[1] = 1;
  ddT[0] = 0;
  ddT[1] = 0;
  for (let n = 2; n < count; n += 1) {
    T[n] = 2 * y * at(T, n - 1) - at(T, n - 2);
    dT[n] = 2 * at(T, n - 1) + 2 * y * at(dT, n - 1) - at(dT, n - 2);
    ddT[n] = 4 * at(dT, n - 1) + 2 * y * at(ddT, n - 1) - at(ddT, n - 2);
  }
}

/** Fills `jet` at a place. */
export function evaluateJet({ starts, coefficients }: PlaneSum, x: number, y: number, jet: Jet): void {
  fill(indexAt(starts, 1), y);
  jet.value = jet.x = jet.y = jet.xx = jet.xy = jet.yy = 0;
  let [t, dt, ddt] = [1, 0, 0];
  let [tBefore, dtBefore, ddtBefore] = [x, 1, 0];
  for (let i = 0; i + 1 < starts.length; i += 1) {
    const start = indexAt(starts, i);
    const count = indexAt(starts, i + 1) - start;
    let [f, fy, fyy] = [0, 0, 0];
    for (let j = 0; j < count; j += 1) {
      const c = at(coefficients, start + j);
      f += c * at(T, j);
      fy += c * at(dT, j);
      fyy += c * at(ddT, j);
    }
    jet.value += t * f;
    jet.x += dt * f;
    jet.y += t * fy;
    jet.xx += ddt * f;
    jet.xy += dt * fy;
    jet.yy += t * fyy;
    const tNext = 2 * x * t - tBefore;
    const dtNext = 2 * t + 2 * x * dt - dtBefore;
    const ddtNext = 4 * dt + 2 * x * ddt - ddtBefore;
    [tBefore, dtBefore, ddtBefore] = [t, dt, ddt];
    [t, dt, ddt] = [tNext, dtNext, ddtNext];
  }
}

/** Several sums of one extent, the coefficients of one term side by side. */
export interface PlaneSums {
  starts: Int32Array;
  count: number;
  coefficients: Float64Array;
}

/** Gathers sums of one extent. */
export function sideBySide(sums: readonly PlaneSum[]): PlaneSums {
  const [first] = sums;
  if (!first) throw new RangeError("no sums");
  const terms = indexAt(first.starts, first.starts.length - 1);
  const coefficients = new Float64Array(terms * sums.length);
  sums.forEach((sum, n) => {
    for (let term = 0; term < terms; term += 1) coefficients[term * sums.length + n] = at(sum.coefficients, term);
  });
  return { starts: first.starts, count: sums.length, coefficients };
}

/** Values of all sums at one place, into `values`. */
export function evaluateAll(
  { starts, count, coefficients }: PlaneSums,
  x: number,
  y: number,
  values: Float64Array,
): void {
  fill(indexAt(starts, 1), y);
  values.fill(0);
  let [t, before] = [1, x];
  let place = 0;
  for (let i = 0; i + 1 < starts.length; i += 1) {
    const terms = indexAt(starts, i + 1) - indexAt(starts, i);
    for (let j = 0; j < terms; j += 1) {
      const product = t * at(T, j);
      for (let n = 0; n < count; n += 1) values[n] = at(values, n) + product * at(coefficients, place + n);
      place += count;
    }
    [t, before] = [2 * x * t - before, t];
  }
}
