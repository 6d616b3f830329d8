import { requireCurvature, requireModulus, requireRadius, requireThickness, requireWithin } from "../inputs.ts";
import { bowFromCurvature } from "../stoney/bow.ts";
import { bowlLift, domeLift } from "./contact.ts";

export interface ChuckFlatteningInput {
  /** m */
  radius: number;
  /** m */
  thickness: number;
  /** Biaxial modulus of the wafer, Pa. */
  biaxialModulus: number;
  /** 0 to 0.4999 */
  poissonsRatio: number;
  /** 1/m, as the wafer lies on the chuck: positive when its edges are up (centre seated), negative when they are down. */
  curvature: number;
  /** Pressure difference that holds the wafer, Pa. */
  vacuum: number;
}

export interface ChuckFlattening {
  /** Gap that the vacuum must first close, m: under the rim of a bowl, under the centre of a dome. */
  gap: number;
  /**
   * Pressure at which a uniform suction would bring that place down, Pa, were the wafer held at its seat alone. Far below any
   * vacuum: the seal decides, not the force.
   */
  pressureNeeded: number;
  /** Change of stress at the faces from free to flat, Pa, tension on the one that was concave. */
  surfaceStress: number;
  /** Height that is left over the chuck under the vacuum, m: the rim of a bowl, a hump just inside the rim of a dome. */
  rimLift: number;
  /** Width of the ring that still stands off, m. */
  rimLength: number;
}

/**
 * A wafer of uniform curvature sucked flat onto a chuck that supports it everywhere.
 *
 * The pressure is 64 D (1 + ν) w/((7 + 3ν) R⁴) for a bowl and 64 D (1 + ν) w/((5 + ν) R⁴) for a dome. A dome's centre touches
 * at just that pressure; a bowl, which touches more and more from its centre, still keeps a third of its gap there.
 * What is left at the rim is solved as a plate with one-sided contact (`contact.ts`); a strip, L = sqrt(2 m/p) and
 * m²/(2 p D) with m = M h³ κ/12, is within 2 % of it for a bowl of 0.5 mm on a full-thickness wafer. Full suction everywhere
 * under the wafer; no friction. Small deflections: a rolled or strongly bowed thin wafer does not have one curvature, and its
 * gap is that of its own shape. Bad input throws `EngineInputError`. Source: own derivation; Timoshenko and
 * Woinowsky-Krieger 1959 for the two pressures.
 */
export function chuckFlattening(i: ChuckFlatteningInput): ChuckFlattening {
  const { radius, thickness, biaxialModulus, poissonsRatio, curvature, vacuum } = check(i);
  // M = E/(1 − ν), so that D = E h³/(12 (1 − ν²)) = M h³/(12 (1 + ν)).
  const stiffness = (biaxialModulus * thickness ** 3) / (12 * (1 + poissonsRatio));
  const bowl = curvature >= 0;
  const gap = Math.abs(bowFromCurvature({ curvature, radius }));
  const seat = bowl ? 7 + 3 * poissonsRatio : 5 + poissonsRatio;
  const pressureNeeded = (64 * stiffness * (1 + poissonsRatio) * gap) / (seat * radius ** 4);
  const lift = (bowl ? bowlLift : domeLift)(
    Math.abs(curvature) * radius,
    (vacuum * radius ** 3) / stiffness,
    poissonsRatio,
  );
  return {
    gap,
    pressureNeeded,
    surfaceStress: (biaxialModulus * thickness * Math.abs(curvature)) / 2,
    rimLift: curvature === 0 ? 0 : radius * lift.height,
    rimLength: curvature === 0 ? 0 : radius * lift.length,
  };
}

function check(i: ChuckFlatteningInput): ChuckFlatteningInput {
  return {
    radius: requireRadius("radius", i.radius),
    thickness: requireThickness("thickness", i.thickness),
    biaxialModulus: requireModulus("biaxialModulus", i.biaxialModulus),
    poissonsRatio: requireWithin("poissonsRatio", i.poissonsRatio, 0, 0.4999, "1"),
    curvature: requireCurvature("curvature", i.curvature),
    vacuum: requireWithin("vacuum", i.vacuum, 0, 1e7, "Pa"),
  };
}
