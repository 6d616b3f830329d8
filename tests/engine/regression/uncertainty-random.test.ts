/*
 * The generator and its distributions: words, uniform and normal numbers. Pinned numbers must come out the same on every
 * machine; the others are checked against closed forms.
 *
 *   z    standard normal number               1
 *   p    share of a distribution below it     1
 */
import { describe, expect, it } from "vitest";
import { portableExp, portableLog, rootSumOfSquares } from "#app/engine/uncertainty/random/elementary.ts";
import { fillUniforms, fillWords, seededState } from "#app/engine/uncertainty/random/generator.ts";
import { inverseNormal, normalShareBelow } from "#app/engine/uncertainty/random/inverse-normal.ts";
import { fillNormals, wordsForNormals } from "#app/engine/uncertainty/random/normal.ts";
import { relative } from "../relative.ts";

function normals(seed: number, count: number): Float64Array {
  const out = new Float64Array(count);
  fillNormals(seededState(seed), out, count, new Int32Array(wordsForNormals(count)));
  return out;
}

describe("words", () => {
  it("are those of another implementation of xoshiro128++, after 102,400 words from the state 1, 2, 3, 4", () => {
    const words = new Int32Array(102401);
    fillWords(new Int32Array([1, 2, 3, 4]), words, words.length);
    expect([...words.subarray(0, 4)].map((word) => word >>> 0)).toEqual([641, 1573767, 3222811527, 3517856514]);
    expect((words[102400] ?? 0) >>> 0).toBe(0x2c873cfa);
  });

  it("go on where they stopped", () => {
    const [whole, parts] = [new Int32Array(10), new Int32Array(10)];
    fillWords(seededState(7), whole, 10);
    const state = seededState(7);
    fillWords(state, parts.subarray(0, 4), 4);
    fillWords(state, parts.subarray(4), 6);
    expect(parts).toEqual(whole);
  });

  it("differ from seed to seed and from stream to stream", () => {
    const first = (seed: number, stream: number) => seededState(seed, stream).join(" ");
    const all = [0, 1, 2, 3].flatMap((seed) => [0, 1, 2, 3].map((stream) => first(seed, stream)));
    expect(new Set(all).size).toBe(16);
  });

  it("refuse a seed that is no 32-bit number", () => {
    for (const seed of [-1, 0.5, 2 ** 32, Number.NaN]) expect(() => seededState(seed)).toThrow("seed");
  });
});

describe("exponential and logarithm", () => {
  it("agree with those of this machine to three roundings", () => {
    for (let n = -300; n <= 300; n += 1) {
      expect(relative(portableExp(n / 7), Math.exp(n / 7))).toBeLessThan(7e-16);
      const x = Math.exp(n / 5);
      expect(Math.abs(portableLog(x) - Math.log(x))).toBeLessThanOrEqual(7e-16 * Math.abs(Math.log(x)) + 1e-300);
    }
    expect(portableLog(1)).toBe(0);
    expect(portableExp(0)).toBe(1);
    expect(rootSumOfSquares([3, 4])).toBe(5);
  });
});

describe("normal distribution", () => {
  it("has the quantiles of another implementation of the same algorithm", () => {
    const expected: [number, number][] = [
      [1e-300, -37.0470962993612],
      [1e-20, -9.262340089798405],
      [1e-6, -4.753424308822899],
      [0.01, -2.3263478740408408],
      [0.025, -1.9599639845400538],
      [0.3, -0.5244005127080407],
      [0.9, 1.2815515655446008],
      [0.975, 1.9599639845400536],
      [0.999999, 4.753424308817089],
    ];
    for (const [p, z] of expected) expect(relative(inverseNormal(p), z)).toBeLessThan(5e-16);
    expect(inverseNormal(0.5)).toBe(0);
    for (const p of [0, 1, -1, Number.NaN]) expect(() => inverseNormal(p)).toThrow("p");
  });

  it("has shares that undo its quantiles", () => {
    for (const p of [1e-12, 1e-4, 0.02, 0.4, 0.5, 0.77, 0.999]) {
      expect(relative(normalShareBelow(inverseNormal(p)), p)).toBeLessThan(1e-13);
    }
    expect(normalShareBelow(-60)).toBe(0);
    expect(normalShareBelow(60)).toBe(1);
  });
});

describe("draws", () => {
  it("are pinned: the same on every machine", () => {
    expect([...normals(1, 5)]).toEqual([
      0.3145045692625626, 0.34509057817545286, -0.30409788246321173, 0.842022716511918, 0.18475244472239524,
    ]);
    const uniforms = new Float64Array(3);
    fillUniforms(seededState(1), uniforms, 3, new Int32Array(6));
    expect([...uniforms]).toEqual([0.04876682318524467, 0.8083502981686468, 0.10939282655532173]);
  });

  it("are normal: largest distance from the distribution within the limit for one chance in a thousand", () => {
    const count = 200_000;
    const sorted = normals(3, count).sort();
    let largest = 0;
    sorted.forEach((z, n) => {
      largest = Math.max(largest, Math.abs(normalShareBelow(z) - (n + 0.5) / count));
    });
    // Kolmogorov's limit: 1.95 over the root of the number.
    expect(largest * Math.sqrt(count)).toBeLessThan(1.95);
  });

  it("reach the tail as often as they should, on both sides", () => {
    const count = 400_000;
    const drawn = normals(5, count);
    for (const sign of [-1, 1]) {
      const expected = count * normalShareBelow(-3.7);
      const found = drawn.filter((z) => sign * z > 3.7).length;
      // Four standard deviations of a count.
      expect(Math.abs(found - expected)).toBeLessThan(4 * Math.sqrt(expected));
    }
  });

  it("do not depend on their neighbours", () => {
    const drawn = normals(11, 100_000);
    for (const lag of [1, 2, 3, 4, 30]) {
      let sum = 0;
      for (let n = lag; n < drawn.length; n += 1) sum += (drawn[n] ?? 0) * (drawn[n - lag] ?? 0);
      expect(Math.abs(sum / Math.sqrt(drawn.length))).toBeLessThan(4);
    }
  });
});
