import { requireCurvature, requireFinite, requireRadius } from "../inputs.ts";

/**
 * Sagitta, m, of a wafer of `radius` (m) with uniform `curvature` (1/m): height of the rim over the centre, so it has the sign
 * of the curvature. By default the parabola κ R²/2, within 0.1 % while the slope κ R at the rim is below 0.1; with `exact`
 * the arc, R being measured along the wafer: (1 − cos κR)/κ.
 *
 * An arc of more than half a turn from centre to rim overlaps itself; its height, 2/κ, is returned then.
 * Bad input throws `EngineInputError`.
 */
export function bowFromCurvature(i: { curvature: number; radius: number; exact?: boolean }): number {
  const curvature = requireCurvature("curvature", i.curvature);
  const radius = requireRadius("radius", i.radius);
  return i.exact ? arcSagitta(curvature, radius) : (curvature * radius * radius) / 2;
}

/** Height of the rim over the centre of an arc, m, for inputs that have been checked; 2/κ from half a turn on. */
export function arcSagitta(curvature: number, radius: number): number {
  const angle = Math.min(Math.abs(curvature) * radius, Math.PI);
  if (angle === 0) return 0;
  // 2 sin²(a/2) is 1 − cos a without its loss of digits at small angles.
  const half = Math.sin(angle / 2);
  return (2 * half * half) / curvature;
}

/**
 * Turns a sagitta with the sign of the curvature (m, rim above centre positive) into the standard bow: centre above the
 * reference plane, device side up, is positive. The one place where the sign changes; never returns negative zero.
 * Source: SEMI MF534 and MF1390.
 */
export function standardBow(sagitta: number): number {
  return requireFinite("sagitta", sagitta) === 0 ? 0 : -sagitta;
}
