import { BLOCK, addBounded, placeNormals, type Drawing } from "./drawing.ts";
import { fillUniforms, fillWords, type GeneratorState } from "./random/generator.ts";
import { rootSumOfSquares } from "./random/elementary.ts";
import { inverseNormal } from "./random/inverse-normal.ts";
import { fillNormals, wordsForNormals } from "./random/normal.ts";
import { normalSlopes, type Sources } from "./sources.ts";

/**
 * Generating vector of a rank-1 lattice for 2^5 to 2^15 points, found component by component for the sum of squared error
 * of smooth periodic functions (P_2, weights 0.9/j) over all those sizes together. Own computation, after the construction of
 * Cools, Kuo and Nuyens 2006.
 */
const LATTICE_VECTOR: readonly number[] = [
  1, 12709, 3473, 6283, 13461, 14601, 14109, 14833, 14889, 12963, 8133, 15597, 1745, 14381, 11269, 13875, 2777, 3385,
  13867, 13529, 2013, 8379, 1087, 3195, 10593, 12205, 4729, 1473, 5153, 469, 1213, 14767,
];

/** Largest number below 1. */
const LARGEST = 1 - 1 / 9007199254740992;

/**
 * One randomly shifted lattice of `points` sets of inputs (a power of two, at least 2), to be drawn once through.
 *
 * The lattice carries what moves the figure most: one coordinate the steepest direction through all normal inputs, by the
 * figure's slopes, and one each bounded input, largest share first. The normal inputs' remainder across that direction is drawn
 * independently, the same for two neighbouring points with opposite sign. Each point by itself has exactly the inputs'
 * distribution, so means and shares are unbiased whatever the slopes are; poor slopes only cost precision. Several lattices
 * with shifts of their own give the standard error.
 * Source: Cranley and Patterson 1976 (random shift); own arrangement of the coordinates.
 */
export function latticeDrawing(sources: Sources, slopes: Float64Array, points: number, state: GeneratorState): Drawing {
  const normals = sources.normal.input.length;
  const bounded = sources.bounded.input.length;
  const direction = unit(normalSlopes(sources, slopes));
  const order = byShare(sources, slopes);
  const z = new Float64Array(BLOCK * normals);
  const u = new Float64Array(BLOCK * bounded);
  const words = new Int32Array(Math.max(wordsForNormals(z.length), 2 * bounded, 2));
  const shift = new Float64Array(1 + bounded);
  fillUniforms(state, shift, 1 + bounded, new Int32Array(2 * (1 + bounded)));
  // Coordinates beyond the vector get a multiplier drawn at random, which keeps every point's own distribution.
  const multipliers = Int32Array.from(order, (_, n) => LATTICE_VECTOR[n + 1] ?? 0);
  fillWords(state, words, 2);
  for (let n = 0; n < bounded; n += 1) {
    if (multipliers[n] === 0) multipliers[n] = (((words[0] ?? 0) >>> 1) + 2 * n) | 1;
  }
  let index = 0;
  return (block, rows) => {
    if (normals > 0) {
      fillNormals(state, z, (rows >> 1) * normals, words);
      spread(z, rows, direction, (row) => inverseNormal(Math.min(LARGEST, (index + row + (shift[0] ?? 0)) / points)));
    }
    placeNormals(sources, block, rows, z);
    if (bounded > 0) {
      for (let row = 0; row < rows; row += 1) {
        for (let n = 0; n < bounded; n += 1) {
          const step = Math.imul(index + row, multipliers[n] ?? 0) & (points - 1);
          const position = step / points + (shift[n + 1] ?? 0);
          u[row * bounded + (order[n] ?? 0)] = position < 1 ? position : position - 1;
        }
      }
      addBounded(sources, block, rows, u);
    }
    index += rows;
  };
}

/**
 * From independent normal sets, one for two rows, to one per row: its part along the unit vector `direction` replaced by `along`,
 * the rest with opposite sign in the second row. Works from the last row down, since the sets lie in the first half.
 */
function spread(z: Float64Array, rows: number, direction: Float64Array, along: (row: number) => number): void {
  const count = direction.length;
  for (let row = rows - 1; row >= 0; row -= 1) {
    const set = (row >> 1) * count;
    const sign = row & 1 ? -1 : 1;
    let part = 0;
    for (let n = 0; n < count; n += 1) part += (direction[n] ?? 0) * (z[set + n] ?? 0);
    const change = along(row) - sign * part;
    for (let n = 0; n < count; n += 1) {
      z[row * count + n] = sign * (z[set + n] ?? 0) + change * (direction[n] ?? 0);
    }
  }
}

/** The vector with length one; the first axis when the figure has no slope. */
function unit(vector: Float64Array): Float64Array {
  const length = rootSumOfSquares(vector);
  return vector.map((value, n) => (length > 0 ? value / length : n === 0 ? 1 : 0));
}

/** The bounded sources, largest share of the figure first. */
function byShare({ bounded }: Sources, slopes: Float64Array): Int32Array {
  const share = (n: number) => Math.abs((slopes[bounded.input[n] ?? 0] ?? 0) * (bounded.halfWidth[n] ?? 0));
  return Int32Array.from([...bounded.input.keys()].sort((a, b) => share(b) - share(a)));
}
