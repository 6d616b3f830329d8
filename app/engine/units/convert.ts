import type { Dimension, UnitDefinition } from "./dimensions.ts";
import { FACTORS, ZEROS } from "./table/factors.ts";

/** `value` of `unit` in the SI unit of the dimension. */
export function toSi(value: number, unit: UnitDefinition, dimension: Dimension): number {
  return scaled(value, factorOf(unit)) + zeroOf(unit, dimension);
}

/** `value` in SI, in `unit`. */
export function fromSi(value: number, unit: UnitDefinition, dimension: Dimension): number {
  return unscaled(value - zeroOf(unit, dimension), factorOf(unit));
}

/** A step of `value` SI units in `unit`: as `fromSi`, but a temperature's offset is left out. */
export function stepFromSi(value: number, unit: UnitDefinition, dimension: Dimension): number {
  if (dimension !== "temperature") return fromSi(value, unit, dimension);
  return value * (fromSi(1, unit, dimension) - fromSi(0, unit, dimension));
}
/** How many of the dimension's SI unit it is. */
function factorOf({ base, times }: UnitDefinition): number {
  if (base === null) return times;
  const factor = FACTORS[base];
  if (factor === undefined) throw new RangeError(`no factor of ${base} in the table of units`);
  return times * factor;
}

/** Where the scale of a temperature has its zero, K; a difference has none. */
function zeroOf({ base }: UnitDefinition, dimension: Dimension): number {
  return dimension === "temperature" && base !== null ? (ZEROS[base] ?? 0) : 0;
}

/** Multiplies by a factor; a factor that is one over a whole number divides, which rounds once instead of twice. */
function scaled(value: number, factor: number): number {
  const whole = wholeInverse(factor);
  return whole === null ? value * factor : value / whole;
}

function unscaled(value: number, factor: number): number {
  const whole = wholeInverse(factor);
  return whole === null ? value / factor : value * whole;
}

function wholeInverse(factor: number): number | null {
  const whole = Math.round(1 / factor);
  return factor < 1 && Math.abs(whole * factor - 1) < 1e-12 ? whole : null;
}
