import { locate, type TablePlace } from "../table/coordinates.ts";
import { eachTerm, polynomials, termCount, type Extent } from "../table/chebyshev.ts";
import { at } from "../table/elements.ts";
import { endlessRoll, type EndlessRoll } from "./endless-roll.ts";
import { leastSquares } from "./least-squares.ts";
import { chebyshevPoints, type SolvedState, type StateFamily } from "./states.ts";

/** A family with its states, its range and its membrane. */
export interface SolvedFamily extends StateFamily {
  lambda: number;
  rate: number;
  states: SolvedState[];
}

/** What a measure's coefficients stand for: (value/uniform − 1) (1 + R/3)/P, of the mean or of half the difference. */
export interface MeasureFit {
  part: "mean" | "halfDifference";
  of: (state: SolvedState) => number;
}

const place: TablePlace = { s: 1, x: 1, y: 0, yq: 0, ys: 0, yss: 0, ysq: 0 };

/** Values of all products at a place, and their derivatives by x and y when asked for. */
function products(
  extent: Extent,
  x: number,
  y: number,
  z: number,
): { f: Float64Array; fx: Float64Array; fy: Float64Array } {
  const [px, py] = [slopes(extent[0], x), slopes(extent[1], y)];
  const pz = polynomials(extent[2], z);
  const count = termCount(extent);
  const [f, fx, fy] = [new Float64Array(count), new Float64Array(count), new Float64Array(count)];
  let n = 0;
  eachTerm(extent, (i, j, k) => {
    f[n] = at(px.value, i) * at(py.value, j) * at(pz, k);
    fx[n] = at(px.slope, i) * at(py.value, j) * at(pz, k);
    fy[n] = at(px.value, i) * at(py.slope, j) * at(pz, k);
    n += 1;
  });
  return { f, fx, fy };
}

function slopes(count: number, x: number): { value: Float64Array; slope: Float64Array } {
  const value = polynomials(count, x);
  const slope = new Float64Array(count);
  for (let n = 1; n < count; n += 1) {
    slope[n] = 2 * at(value, n - 1) + (n === 1 ? -1 : 2 * x * at(slope, n - 1) - at(slope, n - 2));
  }
  return { value, slope };
}

/** Weight of the loads against the energy itself: the loads are what a shape is found from. */
const LOAD_WEIGHT = 2;
/**
 * Weight of a state: those that no load can hold matter only as far as a search passes near them. An isotropic roll turns under
 * a load of the other direction; a crystal's may be held.
 */
function weightOf({ ratios }: StateFamily, state: SolvedState): number {
  const turned = ratios.along === ratios.between ? -state.load.halfDifference / state.halfDifference : 0;
  const excess = Math.max(0, -state.stiffness - 0.1, turned - 0.1);
  return Math.max(0.03, Math.exp(-8 * excess));
}

/** Weight of a point of the endless roll. */
const END_WEIGHT = 1;
const END_POINTS = 12;

/** Coefficients of m/s³, fitted to the energy and to the loads that hold each state. */
export function fitEnergy(extent: Extent, families: readonly SolvedFamily[]): Float64Array {
  const gathered = leastSquares(termCount(extent));
  for (const family of families) {
    const tau = family.ratios.along;
    for (const state of family.states) {
      const squares = state.mean ** 2 + state.halfDifference ** 2;
      const product = squares * state.q;
      locate(squares, state.q, family.rate, place);
      const { s, yq, ys } = place;
      const { f, fx, fy } = products(extent, place.x, place.y, state.z);
      const half = (family.lambda / 2) * product;
      const weight = weightOf(family, state);
      gathered.add(f, state.stretch / (half * product * s ** 3), weight);
      // e by R at one P and by P at one R, as in plate-energy.ts.
      const byR = f.map(
        (value, n) =>
          half *
          product *
          ((3 * s * s * value + s ** 3 * (2 * at(fx, n) + at(fy, n) * ys)) * (-(s ** 5) / 12) -
            (s ** 3 * at(fy, n) * yq * state.q) / squares),
      );
      const byP = f.map((value, n) => half * s ** 3 * (2 * value + (product * at(fy, n) * yq) / squares));
      gathered.add(
        byR.map((value, n) => value + at(byP, n)),
        state.load.mean / state.mean - 1,
        LOAD_WEIGHT * weight,
      );
      gathered.add(
        byR.map((value, n) => (value - at(byP, n)) / tau),
        state.load.halfDifference / state.halfDifference - 1,
        LOAD_WEIGHT * weight,
      );
    }
    addEnd(extent, family, endlessRoll(family.ratios, family.lambda).stretch, gathered.add);
  }
  return gathered.solve();
}

/** Coefficients of one measure. */
export function fitMeasure(extent: Extent, families: readonly SolvedFamily[], fit: MeasureFit): Float64Array {
  const gathered = leastSquares(termCount(extent));
  for (const family of families) {
    for (const state of family.states) {
      const squares = state.mean ** 2 + state.halfDifference ** 2;
      const product = squares * state.q;
      const uniform = state[fit.part];
      locate(squares, state.q, family.rate, place);
      const { f } = products(extent, place.x, place.y, state.z);
      const perUnit = product / (1 + squares / 3);
      const size = state.mean + state.halfDifference;
      gathered.add(
        f,
        (fit.of(state) / uniform - 1) / perUnit,
        weightOf(family, state) * (Math.abs((uniform * perUnit) / size) + 1e-4),
      );
    }
    const end: EndlessRoll = endlessRoll(family.ratios, family.lambda);
    addEnd(extent, family, end[fit.part], gathered.add);
  }
  return gathered.solve();
}

/** The limit at s = 0, the same for every y. */
function addEnd(
  extent: Extent,
  family: SolvedFamily,
  target: number,
  add: (row: Float64Array, target: number, weight: number) => void,
): void {
  for (const y of chebyshevPoints(END_POINTS)) add(products(extent, -1, y, family.z).f, target, END_WEIGHT);
}

/** The measures of the tables, in their order. */
export const MEASURE_FITS: readonly MeasureFit[] = [
  { part: "mean", of: ({ measures: { bow } }) => (bow.x + bow.y) / 2 },
  { part: "halfDifference", of: ({ measures: { bow } }) => (bow.x - bow.y) / 2 },
  { part: "mean", of: ({ measures: { centre } }) => (centre.x + centre.y) / 2 },
  { part: "halfDifference", of: ({ measures: { centre } }) => (centre.x - centre.y) / 2 },
  { part: "mean", of: ({ measures: { parabola } }) => (parabola.x + parabola.y) / 2 },
  { part: "halfDifference", of: ({ measures: { parabola } }) => (parabola.x - parabola.y) / 2 },
  { part: "mean", of: ({ measures: { rim } }) => rim },
];
