import { fillUniforms, type GeneratorState } from "./random/generator.ts";
import { fillNormals, wordsForNormals } from "./random/normal.ts";
import { boundedDeviation, type Sources } from "./sources.ts";

/** Rows of inputs that are drawn and evaluated together: few enough to stay in the fastest memory. */
export const BLOCK = 128;

/** Fills the first rows of a block with sets of inputs, one after the other. At most `BLOCK`. */
export type Drawing = (block: Float64Array, rows: number) => void;

/** Independent draws: the plain Monte Carlo method. Allocates once, then nothing. */
export function plainDrawing(sources: Sources, state: GeneratorState): Drawing {
  const normals = sources.normal.input.length;
  const bounded = sources.bounded.input.length;
  // Where each input has its number, it is drawn into its place: the less memory, the more of it is fast.
  const apart = sources.normal.everyInput ? null : new Float64Array(BLOCK * normals);
  const u = new Float64Array(BLOCK * bounded);
  const words = new Int32Array(Math.max(wordsForNormals(BLOCK * normals), 2 * u.length));
  return (block, rows) => {
    const z = apart ?? block;
    if (normals > 0) fillNormals(state, z, rows * normals, words);
    placeNormals(sources, block, rows, z);
    if (bounded > 0) {
      fillUniforms(state, u, rows * bounded, words);
      addBounded(sources, block, rows, u);
    }
  };
}

/**
 * Sets each row to the best estimates with the normal sources added, standard normal and independent in `z` row by row; `z` is
 * overwritten where they are correlated, and may be the block itself where every input has its source.
 */
export function placeNormals(sources: Sources, block: Float64Array, rows: number, z: Float64Array): void {
  const { best, lower } = sources;
  const { input, scale, everyInput } = sources.normal;
  const count = input.length;
  const width = best.length;
  if (lower) correlate(lower, count, rows, z);
  if (everyInput) {
    for (let row = 0; row < rows; row += 1) {
      const at = row * width;
      for (let n = 0; n < width; n += 1) block[at + n] = (best[n] ?? 0) + (scale[n] ?? 0) * (z[at + n] ?? 0);
    }
    return;
  }
  for (let row = 0; row < rows; row += 1) {
    const at = row * width;
    const from = row * count;
    for (let n = 0; n < width; n += 1) block[at + n] = best[n] ?? 0;
    for (let n = 0; n < count; n += 1) {
      const place = at + (input[n] ?? 0);
      block[place] = (block[place] ?? 0) + (scale[n] ?? 0) * (z[from + n] ?? 0);
    }
  }
}

/** Adds the bounded sources from uniform numbers, row by row. */
export function addBounded({ best, bounded }: Sources, block: Float64Array, rows: number, u: Float64Array): void {
  const { input, halfWidth, triangular } = bounded;
  const count = input.length;
  const width = best.length;
  for (let row = 0; row < rows; row += 1) {
    for (let n = 0; n < count; n += 1) {
      const place = row * width + (input[n] ?? 0);
      const deviation = boundedDeviation(u[row * count + n] ?? 0, triangular[n] === 1);
      block[place] = (block[place] ?? 0) + (halfWidth[n] ?? 0) * deviation;
    }
  }
}

/** z becomes L z in every row, from the last down so that no room is needed. */
function correlate(lower: Float64Array, count: number, rows: number, z: Float64Array): void {
  for (let row = 0; row < rows; row += 1) {
    const from = row * count;
    for (let n = count - 1; n >= 0; n -= 1) {
      let sum = 0;
      for (let k = 0; k <= n; k += 1) sum += (lower[n * count + k] ?? 0) * (z[from + k] ?? 0);
      z[from + n] = sum;
    }
  }
}
