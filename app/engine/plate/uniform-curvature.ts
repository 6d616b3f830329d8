import { membraneStiffness, type ShearRatios } from "./shear-ratios.ts";

/**
 * Closed forms for a free circular plate under equal moments whose two curvatures are each taken as uniform. They explain what
 * happens and are compared with; a real plate bends more at the rim and less in the middle, so its bow is up to a fifth smaller
 * and its onset of rolling up to 5 % later. All without dimensions: curvatures times R²/(4h).
 *
 * With A the mean and B half the difference of the two curvatures and P = A² − B²:
 *
 *   A (1 + λ P) = S,   B (1 − (λ/τ) P) = 0
 *
 * λ measures how stretching resists the mean curvature, 1 − ν when isotropic, and λ/τ, 1 + ν, how it drives the plate to roll.
 * Source: Freund 2000; Masters and Salamon 1993; silicon (001) by own derivation.
 */

/** Mean curvature while the plate stays a bowl: the positive root of A (1 + λ A²) = S. */
export function bowlCurvature(load: number, ratios: ShearRatios): number {
  const scale = Math.sqrt(3 * membraneStiffness(ratios));
  return (2 / scale) * Math.sinh(Math.asinh(1.5 * load * scale) / 3);
}

/** Mean curvature at which the bowl goes over into a roll: 1/sqrt(1 + ν) when isotropic. */
export function onsetCurvature(ratios: ShearRatios): number {
  return Math.sqrt(ratios.along / membraneStiffness(ratios));
}

/** Small-deflection curvature at which it does: 2/(1 + ν)^1.5 when isotropic. */
export function onsetLoad(ratios: ShearRatios): number {
  return onsetCurvature(ratios) * (1 + ratios.along);
}

/**
 * Curvatures along and across the roll past the onset: A = S/(1 + τ) and P = τ/λ, so that isotropic curvatures have the sum
 * (1 + ν) S and the product 1/(1 + ν). Equal up to the onset.
 */
export function rolledCurvatures(load: number, ratios: ShearRatios): { major: number; minor: number } {
  if (load <= onsetLoad(ratios)) {
    const curvature = bowlCurvature(load, ratios);
    return { major: curvature, minor: curvature };
  }
  const mean = load / (1 + ratios.along);
  const major = mean + Math.sqrt(mean * mean - onsetCurvature(ratios) ** 2);
  return { major, minor: onsetCurvature(ratios) ** 2 / major };
}
