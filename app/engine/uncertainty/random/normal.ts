import { fillWords, uniformOf, type GeneratorState } from "./generator.ts";
import { portableExp, portableLog } from "./elementary.ts";

/** Right edge of the lowest layer and area of each of the 256 layers under exp(−x²/2), x > 0. */
const EDGE = 3.654152885361009;
const AREA = 0.004928673233974658;
const LAYERS = 256;
const WORD = 2147483648;

/** Right edges of the layers, the lowest first and wider than `EDGE` by its tail; the curve's height at each. */
const edges = /* @__PURE__ */ edgesOfLayers();
const heights = /* @__PURE__ */ edges.map(density);
/** Edge per unit of a signed 32-bit word, and the part of a layer that lies wholly under the curve. */
const widths = /* @__PURE__ */ edges.map((edge) => edge / WORD);
const inside = /* @__PURE__ */ edges.map((_, layer) => edges[layer + 1] ?? 0);

function density(x: number): number {
  return portableExp((-x * x) / 2);
}

function edgesOfLayers(): Float64Array {
  const edge = new Float64Array(LAYERS + 1);
  edge[0] = AREA / density(EDGE);
  edge[1] = EDGE;
  for (let n = 2; n < LAYERS; n += 1) {
    const last = edge[n - 1] ?? 0;
    edge[n] = Math.sqrt(-2 * portableLog(AREA / last + density(last)));
  }
  return edge;
}

/** Words that `fillNormals` needs room for. */
export function wordsForNormals(count: number): number {
  return count + Math.ceil(count / 4);
}

/**
 * Fills `out` up to `count` with independent standard normal numbers and moves the state on. `words` has room for
 * `wordsForNormals(count)`.
 *
 * The ziggurat method with 256 layers; layer and position come from different words (8 and 32 bits), which avoids the
 * correlation of the first form. Positions have a grain of 2^-31 of a layer's width. Only additions, multiplications, divisions
 * and square roots, all correctly rounded, so a state gives the same numbers on every machine.
 * Source: Marsaglia and Tsang 2000; Doornik 2005, from memory.
 */
export function fillNormals(state: GeneratorState, out: Float64Array, count: number, words: Int32Array): void {
  fillWords(state, words, wordsForNormals(count));
  const fours = count >> 2;
  for (let four = 0; four < fours; four += 1) {
    const n = 4 * four;
    const picks = words[count + four] ?? 0;
    tried(state, out, n, picks & 255, words[n] ?? 0);
    tried(state, out, n + 1, (picks >>> 8) & 255, words[n + 1] ?? 0);
    tried(state, out, n + 2, (picks >>> 16) & 255, words[n + 2] ?? 0);
    tried(state, out, n + 3, picks >>> 24, words[n + 3] ?? 0);
  }
  const last = words[count + fours] ?? 0;
  for (let n = 4 * fours; n < count; n += 1) tried(state, out, n, (last >>> ((n & 3) << 3)) & 255, words[n] ?? 0);
}

function tried(state: GeneratorState, out: Float64Array, n: number, layer: number, word: number): void {
  const x = word * (widths[layer] ?? 0);
  out[n] = x;
  if (!(Math.abs(x) < (inside[layer] ?? 0))) retry(state, out, n, layer);
}

const spare = /* @__PURE__ */ new Int32Array(4);

function spareUniform(state: GeneratorState): number {
  fillWords(state, spare, 2);
  return uniformOf(spare[0] ?? 0, spare[1] ?? 0);
}

/**
 * Decides on the try in `out[n]` that has left the part of its layer wholly under the curve, and tries again until one holds.
 * Once in eighty.
 */
function retry(state: GeneratorState, out: Float64Array, n: number, first: number): void {
  let layer = first;
  let x = out[n] ?? 0;
  while (!(Math.abs(x) < (inside[layer] ?? 0))) {
    if (layer === 0) {
      x = tail(state, x < 0);
      break;
    }
    const low = heights[layer] ?? 0;
    const high = heights[layer + 1] ?? 0;
    if (low + spareUniform(state) * (high - low) < density(x)) break;
    fillWords(state, spare, 2);
    layer = (spare[1] ?? 0) >>> 24;
    x = (spare[0] ?? 0) * (widths[layer] ?? 0);
  }
  out[n] = x;
}

/** A normal number beyond `EDGE`, by Marsaglia's method for the tail. */
function tail(state: GeneratorState, negative: boolean): number {
  for (;;) {
    const x = -portableLog(spareUniform(state)) / EDGE;
    const y = -portableLog(spareUniform(state));
    if (2 * y > x * x) return negative ? -(EDGE + x) : EDGE + x;
  }
}
