import { EngineInputError } from "./errors.ts";

/** Returns `value` when it is a finite number, else throws `EngineInputError`. */
export function requireFinite(field: string, value: number): number {
  if (typeof value !== "number" || !Number.isFinite(value)) {
    throw new EngineInputError(field, "must be a finite number", "any finite number");
  }
  return value;
}

/**
 * Returns `value` when it lies in `low` to `high`, both ends allowed, else throws `EngineInputError`. The bounds are wide
 * enough for anything a wafer line makes and narrow enough that no product of legal inputs leaves the number range.
 */
export function requireWithin(field: string, value: number, low: number, high: number, unit: string): number {
  const suffix = unit === "1" ? "" : ` ${unit}`;
  const allowed = `${low} to ${high}${suffix}`;
  if (typeof value !== "number" || !Number.isFinite(value)) {
    throw new EngineInputError(field, "must be a finite number", allowed);
  }
  if (value < low) throw new EngineInputError(field, `${value}${suffix} is too small`, allowed);
  if (value > high) throw new EngineInputError(field, `${value}${suffix} is too large`, allowed);
  return value;
}

/** Thickness of a layer, wafer or pair, m. */
export function requireThickness(field: string, value: number): number {
  return requireWithin(field, value, 1e-10, 0.1, "m");
}

/** Young's or biaxial modulus, Pa: from a gel to above diamond. */
export function requireModulus(field: string, value: number): number {
  return requireWithin(field, value, 1, 5e12, "Pa");
}

/** Poisson's ratio of an isotropic material. */
export function requirePoisson(field: string, value: number): number {
  return requireWithin(field, value, -0.9, 0.4999, "1");
}

/** Stress, Pa, either sign. */
export function requireStress(field: string, value: number): number {
  return requireWithin(field, value, -1e11, 1e11, "Pa");
}

/** Radius of a wafer, m. */
export function requireRadius(field: string, value: number): number {
  return requireWithin(field, value, 1e-4, 10, "m");
}

/** Curvature, 1/m, either sign: down to a bending radius of a tenth of a micrometre. */
export function requireCurvature(field: string, value: number): number {
  return requireWithin(field, value, -1e7, 1e7, "1/m");
}

/** Temperature point, K. */
export function requireTemperature(field: string, value: number): number {
  return requireWithin(field, value, 1, 5000, "K");
}
