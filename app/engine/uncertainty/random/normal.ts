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
  for (let from = 0; from < count; from += PIECE) {
    const to = Math.min(count, from + PIECE);
    retryAll(state, out, words, count, firstTries(out, from, to, words, count));
  }
}

/** Normal numbers that are tried before those among them that have to be tried again are. */
const PIECE = 1024;

/** Their places. */
const again = /* @__PURE__ */ new Int32Array(PIECE);

/** Fills places of `out` with first tries, notes in `again` those that do not hold yet, and returns how many they are. */
function firstTries(out: Float64Array, from: number, to: number, words: Int32Array, count: number): number {
  let beyond = 0;
  let n = from;
  for (const fours = to - 3; n < fours; n = (n + 4) | 0) {
    const picks = words[(count + (n >> 2)) | 0] ?? 0;
    beyond = tried(out, n, picks & 255, words[n] ?? 0, beyond);
    beyond = tried(out, (n + 1) | 0, (picks >>> 8) & 255, words[(n + 1) | 0] ?? 0, beyond);
    beyond = tried(out, (n + 2) | 0, (picks >>> 16) & 255, words[(n + 2) | 0] ?? 0, beyond);
    beyond = tried(out, (n + 3) | 0, picks >>> 24, words[(n + 3) | 0] ?? 0, beyond);
  }
  for (; n < to; n += 1) beyond = tried(out, n, layerOf(words, count, n), words[n] ?? 0, beyond);
  return beyond;
}

/**
 * One first try, which notes its place and returns how many places are noted if it does not hold. Made by another function, so that
 * V8 takes the tables around it as the constants that they are (a bundler turns those of a module into variables).
 */
const tried = /* @__PURE__ */ makeTried();

function makeTried() {
  const width = widths;
  const limit = inside;
  const places = again;
  return (out: Float64Array, n: number, layer: number, word: number, beyond: number): number => {
    // By names of its own, as `bendStacks`.
    const w = width;
    const safe = limit;
    const noted = places;
    const x = word * (w[layer] ?? 0);
    out[n] = x;
    noted[beyond] = n;
    return (beyond + (Math.abs(x) < (safe[layer] ?? 0) ? 0 : 1)) | 0;
  };
}

/** Tries the first of the noted places again, in their order. */
function retryAll(state: GeneratorState, out: Float64Array, words: Int32Array, count: number, beyond: number): void {
  for (let n = 0; n < beyond; n += 1) {
    const place = again[n] ?? 0;
    retry(state, out, place, layerOf(words, count, place));
  }
}

/** The layer of the number at a place: a byte each of the words behind `count`. */
function layerOf(words: Int32Array, count: number, place: number): number {
  return ((words[(count + (place >> 2)) | 0] ?? 0) >>> ((place & 3) << 3)) & 255;
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
    if (isUnder(layer, x, spareUniform(state))) break;
    fillWords(state, spare, 2);
    layer = (spare[1] ?? 0) >>> 24;
    x = (spare[0] ?? 0) * (widths[layer] ?? 0);
  }
  out[n] = x;
}

/**
 * Whether the point at a share `up` of a layer's height and at `x` lies under the curve. With d = (edge² − x²)/2 the curve is e^d
 * times its height at the layer's edge; 1 + d + d²/2 + d³/6 is below e^d, and with d⁴/12 more above it as long as d < 0.69. The
 * exponential itself is asked only between the two, once in thousands.
 */
function isUnder(layer: number, x: number, up: number): boolean {
  const low = heights[layer] ?? 0;
  const edge = edges[layer] ?? 0;
  const point = low + up * ((heights[layer + 1] ?? 0) - low);
  const d = 0.5 * (edge * edge - x * x);
  const least = low * (1 + d * (1 + d * (0.5 + d * (1 / 6))));
  if (point < least) return true;
  if (d < 0.69 && point > least + low * (d * d) * (d * d) * (1 / 12)) return false;
  return point < density(x);
}

/** A normal number beyond `EDGE`, by Marsaglia's method for the tail. */
function tail(state: GeneratorState, negative: boolean): number {
  for (;;) {
    const x = -portableLog(spareUniform(state)) / EDGE;
    const y = -portableLog(spareUniform(state));
    if (2 * y > x * x) return negative ? -(EDGE + x) : EDGE + x;
  }
}
