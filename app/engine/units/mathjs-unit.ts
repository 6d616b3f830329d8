import { createComplexClass, createFractionClass, createUnitClass } from "mathjs";

// The factory is public in the package but missing from its type declarations.
declare module "mathjs" {
  interface UnitOfMeasure {
    toNumber(unit: string): number;
  }
  function createUnitClass(scope: Record<string, unknown>): new (value: number, unit: string) => UnitOfMeasure;
  function createFractionClass(): unknown;
  function createComplexClass(): unknown;
}

type UnitClass = ReturnType<typeof createUnitClass>;

let unitClass: UnitClass | null = null;

/**
 * The package's unit class over plain numbers. Made from its factory alone, because the ready-made build brings big numbers,
 * matrices and the expression parser along; made on first use, so that a page without units does not carry it.
 */
function units(): UnitClass {
  unitClass ??= createUnitClass({
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
    Complex: createComplexClass(),
    BigNumber: null,
    Fraction: createFractionClass(),
  });
  return unitClass;
}

/**
 * `value` of one unit in another. Units are the package's names, written in this program's tables and never taken from a user's
 * text. Throws when the two are not of the same dimension.
 */
export function convert(value: number, from: string, to: string): number {
  return new (units())(value, from).toNumber(to);
}
