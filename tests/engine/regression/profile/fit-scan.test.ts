/*
 * The fit of a scan against least squares by an independent route: mathjs's QR factors and its normal equations.
 *
 *   x  position, z height                                m
 *   c  coefficients of 1, t, t², … with t = x/half-width m
 */
import { inv, multiply, qr, transpose, usolve } from "mathjs";
import { describe, expect, it } from "vitest";
import { fitScan } from "#app/engine/profile/fit-scan.ts";
import { relative } from "../../relative.ts";

/** Heights that no formula knows: a repeating pattern of two lengths that share no factor. */
function waferScan(count: number) {
  const x = Float64Array.from({ length: count }, (_, n) => -0.06 + (0.12 * n) / (count - 1) + 1e-5 * ((n * 7) % 5));
  const z = x.map((at, n) => 2e-6 + 3e-4 * at + 0.004 * at * at + 0.02 * at ** 3 + 4e-8 * (((n * 11) % 13) - 6));
  return { x, z };
}

function byQr(t: number[], z: number[], degree: number): number[] {
  const { Q, R } = qr(t.map((at) => Array.from({ length: degree + 1 }, (_, power) => at ** power)));
  const [q, r] = [Q as number[][], R as number[][]];
  const right = Array.from({ length: degree + 1 }, (_, k) =>
    q.reduce((sum, row, n) => sum + (row[k] ?? 0) * (z[n] ?? 0), 0),
  );
  return (usolve(r.slice(0, degree + 1), right) as number[][]).flat();
}

describe("fitScan against mathjs", () => {
  const { x, z } = waferScan(61);
  const fit = fitScan({ x, z }, { edgeExclusion: 0 });
  const t = [...x].map((at) => (at - fit.centre) / fit.halfWidth);

  it("curvature, tilt and height by QR factors", () => {
    const [c0 = 0, c1 = 0, c2 = 0] = byQr(t, [...z], 2);
    const slope = c1 / fit.halfWidth;
    // Digits of a double through 61 rows.
    expect(relative(fit.curvature, (2 * c2) / fit.halfWidth ** 2 / (1 + slope * slope) ** 1.5)).toBeLessThan(1e-12);
    expect(relative(Math.tan(fit.tilt), slope)).toBeLessThan(1e-12);
    expect(relative(fit.offset, c0)).toBeLessThan(1e-11);
    const c4 = byQr(t, [...z], 4)[4] ?? 0;
    expect(relative(fit.shape.quarticHeight, c4)).toBeLessThan(1e-8);
  });

  it("standard uncertainty by the inverse of the normal equations", () => {
    const rows = t.map((at) => [1, at, at * at]);
    const inverse = inv(multiply(transpose(rows), rows));
    const [c0 = 0, c1 = 0, c2 = 0] = byQr(t, [...z], 2);
    const squares = t.reduce((sum, at, n) => sum + ((z[n] ?? 0) - (c0 + c1 * at + c2 * at * at)) ** 2, 0);
    const spread = Math.sqrt((squares / (t.length - 3)) * (inverse[2]?.[2] ?? 0));
    const slope = c1 / fit.halfWidth;
    const expected = (2 * spread) / fit.halfWidth ** 2 / (1 + slope * slope) ** 1.5;
    expect(relative(fit.standardUncertainty / fit.scatter.inflation, expected)).toBeLessThan(1e-10);
  });
});
