import { createUnitClass, Fraction } from "mathjs";

// The factory is public in the package but missing from its type declarations.
declare module "mathjs" {
  interface UnitOfMeasure {
    toNumber(unit: string): number;
  }
  function createUnitClass(scope: Record<string, unknown>): new (value: number, unit: string) => UnitOfMeasure;
}

/**
 * The package's unit class over plain numbers: what is written into the table is what double precision makes of the package's own
 * figures. Its table keeps 5/9 of the Fahrenheit scale as a fraction, and one unit of power, not used here, as a complex
 * number.
 */
const Unit = createUnitClass({
  config: { predictable: false, number: "number" },
  addScalar: (a: number, b: number) => a + b,
  subtractScalar: (a: number, b: number) => a - b,
  multiplyScalar: (a: number, b: number) => a * b,
  divideScalar: (a: number, b: number) => a / b,
  pow: Math.pow,
  abs: Math.abs,
  fix: Math.trunc,
  round: Math.round,
  equal: (a: number, b: number) => a === b,
  isNumeric: (value: unknown) => typeof value === "number",
  format: String,
  number: Number,
  Complex: { I: NaN },
  BigNumber: null,
  Fraction,
});

/** `value` of one unit in another, both by the package's names. Throws when the two are not of the same dimension. */
export function convert(value: number, from: string, to: string): number {
  return new Unit(value, from).toNumber(to);
}
