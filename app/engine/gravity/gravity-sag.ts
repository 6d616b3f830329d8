import { EngineInputError } from "../errors.ts";
import { requireModulus, requireRadius, requireThickness, requireWithin } from "../inputs.ts";
import { bendingStiffness } from "./bending-stiffness.ts";
import { carriedLargeSag, largeSag, type LargeSag } from "./linear-limit.ts";
import { carriedLinearSag, linearSag, type LinearSag } from "./linear-sag.ts";
import { checkCarrying, checkSupport, type CarryingSupport, type RelativeSupport, type Support } from "./support.ts";

/** Standard acceleration of free fall, m/s², exact by definition (3rd General Conference on Weights and Measures, 1901). */
export const STANDARD_GRAVITY = 9.80665;

export interface GravitySagInput {
  /** m */
  radius: number;
  /** m; of a pair or a thick film its effective thickness only together with a density that keeps the weight. */
  thickness: number;
  /** Pa; for silicon `siliconSagConstants`. */
  youngsModulus: number;
  /** 0 to 0.4999 */
  poissonsRatio: number;
  /** kg/m³; silicon `SILICON_DENSITY`. */
  density: number;
  /** m/s², default standard gravity. */
  gravity?: number;
  support: Support;
}

/** Heights in m, z up, zero at the supports; small deflections but for `largeDeflection`. */
export interface GravitySag {
  /** Of the centre; negative when it hangs below the supports. */
  centre: number;
  /** Highest and lowest place of the rim. */
  rimHigh: number;
  rimLow: number;
  /** Highest less lowest place of the wafer, never negative. */
  peakToValley: number;
  /** Root mean square about the mean height; for points only, else null. */
  rms: number | null;
  /** false where the sag of small deflections is more than 5 % off: it is an upper bound then. */
  linearValid: boolean;
  /** Peak to valley of large deflections, between two bounds, m; null where nothing better than the upper bound is known. */
  largeDeflection: { low: number; high: number } | null;
  /** q a⁴/(D h): what decides whether deflections are small. */
  load: number;
}

/**
 * Sag of a flat wafer under its own weight on a support.
 *
 * Small deflections: exact for rings, centre point and centre cup, within 1e-6 for points, within 0.2 % (2 % where it is least)
 * for rails. Large deflections, where known: a ring under the rim (von Karman, full symmetry) within 0.1 %, three points at the
 * rim (threefold symmetry) within 1 % up to a load of 300, else a band of 0.6 to 1.0 of the linear sag.
 *
 * Silicon (100) stands as isotropic with the constants of `siliconSagConstants`, which states the error: 0.03 % on a ring under
 * the rim, 0.8 % on three points there, more on inner points and rails. A wafer bent by films, or thin enough to roll, takes
 * another shape under its weight: sag and bow do not add then.
 * Bad input throws `EngineInputError`.
 *
 * Source: Timoshenko and Woinowsky-Krieger 1959; Chen 2003, equation 47.75; Nelson, Lubliner and Mast 1982 for points; own
 * computation for rails and large deflections.
 */
export function gravitySag(i: GravitySagInput): GravitySag {
  return sagOf(i, checkSupport(i.support, requireRadius("radius", i.radius)), linearSag, largeSag);
}

/** The same on what tools carry wafers by: points and rails. For the rules, which know no other support. */
export function carriedSag(i: GravitySagInput & { support: CarryingSupport }): GravitySag {
  return sagOf(i, checkCarrying(i.support, requireRadius("radius", i.radius)), carriedLinearSag, carriedLargeSag);
}

function sagOf<Relative extends RelativeSupport>(
  i: GravitySagInput,
  support: Relative,
  linearOn: (support: Relative, nu: number) => LinearSag,
  largeOn: (support: Relative, q: number, nu: number, sag: number) => LargeSag,
): GravitySag {
  const { radius, thickness, stiffness, poissonsRatio, weight } = checkWafer(i);
  const unit = (weight * radius ** 4) / stiffness;
  const linear = linearOn(support, poissonsRatio);
  const load = unit / thickness;
  const large = largeOn(support, load, poissonsRatio, linear.peakToValley * load);
  return {
    centre: unit * linear.centre,
    rimHigh: unit * linear.rimHigh,
    rimLow: unit * linear.rimLow,
    peakToValley: unit * linear.peakToValley,
    rms: linear.rms === null ? null : unit * linear.rms,
    linearValid: large.linearValid,
    largeDeflection: large.range && { low: thickness * large.range.low, high: thickness * large.range.high },
    load,
  };
}

/** Checks the wafer; `weight` is per area, Pa, and `stiffness` D, N·m. */
export function checkWafer(i: Omit<GravitySagInput, "support">) {
  const radius = requireRadius("radius", i.radius);
  const thickness = requireThickness("thickness", i.thickness);
  if (thickness > radius / 5) {
    throw new EngineInputError("thickness", "is no plate: more than a fifth of the radius", `up to ${radius / 5} m`);
  }
  const youngsModulus = requireModulus("youngsModulus", i.youngsModulus);
  const poissonsRatio = requireWithin("poissonsRatio", i.poissonsRatio, 0, 0.4999, "1");
  const density = requireWithin("density", i.density, 1, 30000, "kg/m3");
  const gravity = requireWithin("gravity", i.gravity ?? STANDARD_GRAVITY, 0, 100, "m/s2");
  return {
    radius,
    thickness,
    poissonsRatio,
    stiffness: bendingStiffness(youngsModulus, thickness, poissonsRatio),
    weight: density * gravity * thickness,
  };
}
