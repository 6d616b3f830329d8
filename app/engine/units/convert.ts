import { DIMENSIONS, type Dimension, type DimensionDefinition, type UnitDefinition } from "./dimensions.ts";
import { convert } from "./mathjs-unit.ts";

/** `value` of `unit` in the SI unit of the dimension. */
export function toSi(value: number, unit: UnitDefinition, dimension: Dimension): number {
  const { si }: DimensionDefinition = DIMENSIONS[dimension];
  if (unit.base === null || si === null) return scaled(value, unit.times);
  if (dimension === "temperature") return convert(value, unit.base, si);
  return scaled(value, convert(unit.times, unit.base, si));
}

/** `value` in SI, in `unit`. */
export function fromSi(value: number, unit: UnitDefinition, dimension: Dimension): number {
  const { si }: DimensionDefinition = DIMENSIONS[dimension];
  if (unit.base === null || si === null) return unscaled(value, unit.times);
  if (dimension === "temperature") return convert(value, si, unit.base);
  return unscaled(value, convert(unit.times, unit.base, si));
}

/** A step of `value` SI units in `unit`: as `fromSi`, but a temperature's offset is left out. */
export function stepFromSi(value: number, unit: UnitDefinition, dimension: Dimension): number {
  if (dimension !== "temperature") return fromSi(value, unit, dimension);
  return value * (fromSi(1, unit, dimension) - fromSi(0, unit, dimension));
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
