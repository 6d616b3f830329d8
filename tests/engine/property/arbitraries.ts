import fc from "fast-check";
import type { Layer } from "#app/engine/laminate/layer.ts";

/** A number spread evenly over the powers of ten between two positive bounds. */
export function logarithmic(low: number, high: number): fc.Arbitrary<number> {
  return fc
    .double({ min: Math.log(low), max: Math.log(high), noNaN: true })
    .map((power) => Math.min(high, Math.max(low, Math.exp(power))));
}

/** A number between two bounds, no negative zero. */
export function between(low: number, high: number): fc.Arbitrary<number> {
  return fc.double({ min: low, max: high, noNaN: true }).map((value) => (value === 0 ? 0 : value));
}

/** A layer such as a wafer line makes: metals, ceramics, polymers, adhesives. */
export const anyLayer: fc.Arbitrary<Layer> = fc.record({
  thickness: logarithmic(10e-9, 1e-3),
  youngsModulus: logarithmic(1e6, 400e9),
  poissonsRatio: between(0, 0.49),
  stress: between(-1e9, 1e9),
  cte: between(0, 100e-6),
  referenceTemperature: between(250, 600),
  coverage: between(0.05, 1),
});

/** A bare silicon (100) wafer of any usual thickness. */
export const siliconLayer: fc.Arbitrary<Layer> = logarithmic(10e-6, 1e-3).map((thickness) => ({
  thickness,
  youngsModulus: 130e9,
  poissonsRatio: 0.2786,
  cte: "silicon" as const,
}));
