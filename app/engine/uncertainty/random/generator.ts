import { EngineInputError } from "../../errors.ts";

/** State of a generator: four 32-bit words, not all zero. */
export type GeneratorState = Int32Array;

/**
 * The state that a seed stands for. `stream` gives further, unrelated sequences of the same seed. Integer arithmetic only, so
 * equal on every machine.
 * Source: the mixing function of Steele, Lea and Flood 2014 in its 32-bit form, from memory.
 * @throws EngineInputError when the seed is not a whole number from 0 to 2^32 − 1
 */
export function seededState(seed: number, stream = 0): GeneratorState {
  if (!Number.isInteger(seed) || seed < 0 || seed > 0xffffffff)
    throw new EngineInputError("seed", "is not a whole number in range", "0 to 4294967295");
  let counter = mixed(seed | 0) ^ Math.imul(stream | 0, 0x632be59b);
  const state = new Int32Array(4);
  for (let n = 0; n < 4; n += 1) {
    counter = (counter + 0x9e3779b9) | 0;
    state[n] = mixed(counter);
  }
  // One word set makes the state valid whatever the others are.
  state[3] = (state[3] ?? 0) | 1;
  return state;
}

function mixed(value: number): number {
  let z = value;
  z = Math.imul(z ^ (z >>> 16), 0x21f0aaad);
  z = Math.imul(z ^ (z >>> 15), 0x735a2d97);
  return z ^ (z >>> 15);
}

/**
 * Fills `words` up to `count` with random 32-bit words and moves the state on. xoshiro128++: period 2^128 − 1, shifts, rotations
 * and additions of 32-bit words only, so the same on every machine.
 * Source: Blackman and Vigna 2021, from memory.
 */
export function fillWords(state: GeneratorState, words: Int32Array, count: number): void {
  let s0 = state[0] ?? 0;
  let s1 = state[1] ?? 0;
  let s2 = state[2] ?? 0;
  let s3 = state[3] ?? 0;
  for (let n = 0; n < count; n += 1) {
    const sum = (s0 + s3) | 0;
    words[n] = ((sum << 7) | (sum >>> 25)) + s0;
    const shifted = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= shifted;
    s3 = (s3 << 11) | (s3 >>> 21);
  }
  state[0] = s0;
  state[1] = s1;
  state[2] = s2;
  state[3] = s3;
}

/** One number over 0 and below 1, evenly spread, of 53 bits from two words. */
export function uniformOf(high: number, low: number): number {
  return ((high >>> 6) * 134217728 + (low >>> 5) + 0.5) / 9007199254740992;
}

/** Fills `out` up to `count` with numbers over 0 and below 1, evenly spread; `words` holds twice as many. */
export function fillUniforms(state: GeneratorState, out: Float64Array, count: number, words: Int32Array): void {
  fillWords(state, words, 2 * count);
  for (let n = 0; n < count; n += 1) out[n] = uniformOf(words[2 * n] ?? 0, words[2 * n + 1] ?? 0);
}
