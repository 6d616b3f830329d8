/*
 * Student's and Fisher's distributions against closed forms for few degrees of freedom.
 *
 *   t   factor      ν  degrees of freedom      p  share within ± t      F  ratio of variances
 */
import { describe, expect, it } from "vitest";
import { studentFactor, varianceRatioBeyond } from "#app/engine/uncertainty/student.ts";
import { relative } from "../relative.ts";

describe("studentFactor", () => {
  it.each([0.5, 0.9, 0.95, 0.9545, 0.99, 0.999])("one and two degrees of freedom at %d", (p) => {
    // ν = 1 is Cauchy's distribution; ν = 2 has p = t/sqrt(2 + t²).
    expect(relative(studentFactor(1, p), Math.tan((Math.PI * p) / 2))).toBeLessThan(1e-9);
    expect(relative(studentFactor(2, p), p * Math.sqrt(2 / (1 - p * p)))).toBeLessThan(1e-9);
  });

  it("goes over into the normal distribution", () => {
    // 1.959963984540054: two-sided 95 % of the normal distribution; the next term is (t³ + t)/(4 ν).
    const z = 1.959963984540054;
    expect(relative(studentFactor(1e6, 0.95), z + (z ** 3 + z) / 4e6)).toBeLessThan(1e-9);
    expect(relative(studentFactor(Number.POSITIVE_INFINITY), 2)).toBeLessThan(1e-6);
  });

  it("refuses what is no share and no number of degrees", () => {
    expect(() => studentFactor(0)).toThrow(/degreesOfFreedom/);
    expect(() => studentFactor(5, 1)).toThrow(/share/);
  });
});

describe("varianceRatioBeyond", () => {
  it("two and two degrees of freedom: 1/(1 + F)", () => {
    for (const ratio of [0, 0.3, 1, 4, 50]) expect(varianceRatioBeyond(ratio, 2, 2)).toBeCloseTo(1 / (1 + ratio), 12);
  });

  it("with one above it is Student's, squared", () => {
    expect(varianceRatioBeyond(studentFactor(12, 0.95) ** 2, 1, 12)).toBeCloseTo(0.05, 10);
  });
});
