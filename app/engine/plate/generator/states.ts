import type { ShearRatios } from "../shear-ratios.ts";
import { borderRate, range, squaresAt } from "../table/coordinates.ts";
import { at } from "../table/elements.ts";
import { settle, uniformShape } from "./equilibrium.ts";
import { measurer, type Measurer, type Measures } from "./measures.ts";
import { ritzPlate, ritzSpace, type RitzSpace } from "./ritz-plate.ts";

/** A shape of least energy among those of its mean curvatures, as the tables are fitted to. */
export interface SolvedState {
  /** Third coordinate of the table. */
  z: number;
  s: number;
  /** (A² − B²)/(A² + B²). */
  q: number;
  /** Mean and half difference of the mean curvatures, times R²/(4h). */
  mean: number;
  halfDifference: number;
  /** Internal energy less that of uniform bending. */
  stretch: number;
  /** Load that holds the shape, as small-deflection curvatures times R²/(4h). */
  load: { mean: number; halfDifference: number };
  /** Least stiffness against a change of the mean curvatures, over that of a flat wafer; below 0 when unstable. */
  stiffness: number;
  measures: Measures;
}

/** One material and direction to solve. */
export interface StateFamily {
  ratios: ShearRatios;
  /** Poisson's ratio that sets the range of the table. */
  poissonsRatio: number;
  z: number;
}

/** Ritz spaces by how sharply the rim bends: the degree that keeps every figure within 1e-4 up to the given A² + B². */
const DEGREES: readonly (readonly [squares: number, degree: number])[] = [
  [60, 18],
  [700, 24],
  [5000, 28],
  [Infinity, 34],
];

interface Solver {
  squares: number;
  space: RitzSpace;
  measure: Measurer;
}

let solvers: Solver[] | null = null;

function solverFor(squares: number): Solver {
  solvers ??= DEGREES.map(([most, degree]) => {
    const space = ritzSpace("even", degree);
    return { squares: most, space, measure: measurer(space) };
  });
  const found = solvers.find((one) => squares <= one.squares);
  if (!found) throw new RangeError("no space");
  return found;
}

/** Points from −1 to 1, denser towards the ends, where a polynomial needs them. */
export function chebyshevPoints(count: number): number[] {
  return Array.from({ length: count }, (_, n) => -Math.cos((Math.PI * (n + 0.5)) / count));
}

/** How far the samples reach over the table's range in y, so that slightly outside it is still sound. */
const OVERHANG = 0.06;

/** Least s that is solved; from there to the endless roll the tables follow the limit's closed form. */
export const LEAST_S = 0.0904;

/** Solves a family over the table's range: `along` values of s and `across` values of y. */
export function solveStates(family: StateFamily, along: number, across: number): SolvedState[] {
  const found: SolvedState[] = [];
  const places = chebyshevPoints(along).map((x) => LEAST_S + ((1 - LEAST_S) * (1 + x)) / 2);
  for (const s of places) {
    const squares = squaresAt(s);
    const { space, measure } = solverFor(squares);
    const plate = ritzPlate(space, family.ratios);
    const [low, high] = range(s, borderRate(family.poissonsRatio));
    const margin = ((high - low) / 2) * OVERHANG;
    const [lowest, highest] = [Math.max(low - margin, -1), Math.min(high + margin, 1)];
    const wanted = chebyshevPoints(across).map((y) => (highest + lowest) / 2 + ((highest - lowest) / 2) * y);
    for (const side of [1, -1]) {
      let previous: { shape: Float64Array; q: number } | null = null;
      const outwards = wanted.filter((q) => q * side > 1e-6).sort((a, b) => Math.abs(a) - Math.abs(b));
      for (const q of outwards) {
        const mean = Math.sqrt((squares * (1 + q)) / 2);
        const halfDifference = Math.sqrt((squares * (1 - q)) / 2);
        const start = uniformShape(plate, { mean, halfDifference });
        if (previous) {
          for (let n = space.uniform; n < plate.size; n += 1) start[n] = (at(previous.shape, n) * q) / previous.q;
        }
        const solved = settle(plate, start, null);
        previous = { shape: solved.shape, q };
        const bending = mean * mean + family.ratios.along * halfDifference * halfDifference;
        found.push({
          z: family.z,
          s,
          q,
          mean,
          halfDifference,
          stretch: solved.energy - bending,
          load: solved.load,
          stiffness: solved.stiffness,
          measures: measure(solved.shape),
        });
      }
    }
  }
  return found;
}
