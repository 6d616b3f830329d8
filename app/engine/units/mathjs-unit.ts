import { createUnitClass } from "mathjs";

// The factory is public in the package but missing from its type declarations.
declare module "mathjs" {
  interface UnitOfMeasure {
    toNumber(unit: string): number;
  }
  function createUnitClass(scope: Record<string, unknown>): new (value: number, unit: string) => UnitOfMeasure;
}

/** What the package's table needs of a fraction: it keeps 5/9 of the Fahrenheit scale as one, and turns it into a number when used. */
class Quotient {
  readonly isFraction = true;
  readonly above: number;
  readonly below: number;

  constructor(above: number, below: number) {
    this.above = above;
    this.below = below;
  }

  valueOf(): number {
    return this.above / this.below;
  }
}

type UnitClass = ReturnType<typeof createUnitClass>;

let unitClass: UnitClass | null = null;

/**
 * The package's unit class over plain numbers. Made from its factory alone, because the ready-made build brings big numbers,
 * matrices and the expression parser along, and without its complex numbers and fractions, which would be a tenth of what the
 * live estimate loads; made on first use, so that a page without units does not carry it.
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
    // Its table of units holds one complex number, of a unit of power that is not used here.
    Complex: { I: NaN },
    BigNumber: null,
    Fraction: Quotient,
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
