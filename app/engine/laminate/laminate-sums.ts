/** Places of the sums of `laminateSums` in its output. */
const STRETCHING = 0;
const STRETCHING_MOMENT = 1;
const BENDING = 2;
const FORCE = 3;
const MOMENT = 4;

/** Length of the output of `laminateSums`. */
export const LAMINATE_SUMS = 5;

/**
 * The sums through a stack of layers that its bending follows from, about a reference height and a reference strain, written
 * into `sums`: with the stiffness s = M f h of a layer, the height z of its middle over the reference and its free strain e
 * over the reference strain,
 *
 *   sum of s (N/m),  of s z (N),  of s (z² + h²/12) (N·m),  of s e (N/m),  of s e z (N).
 *
 * `thickness` (m) is read from place `at` on, bottom to top; `modulus` is M f (Pa), the biaxial modulus times the area fraction;
 * `pressure` is M f e (Pa); `bottom` is the height of the lowest face over the reference (m). Nothing is checked and nothing
 * allocated, because this is the inner loop of sampling.
 */
export function laminateSums(
  count: number,
  thickness: Float64Array,
  at: number,
  modulus: Float64Array,
  pressure: Float64Array,
  bottom: number,
  sums: Float64Array,
): void {
  let below = bottom;
  let stretching = 0;
  let stretchingMoment = 0;
  let bending = 0;
  let force = 0;
  let moment = 0;
  for (let n = 0; n < count; n += 1) {
    const height = thickness[at + n] ?? 0;
    const half = 0.5 * height;
    const centre = below + half;
    below += height;
    const stiffness = (modulus[n] ?? 0) * height;
    const pull = (pressure[n] ?? 0) * height;
    stretching += stiffness;
    stretchingMoment += stiffness * centre;
    bending += stiffness * (centre * centre + half * half * (1 / 3));
    force += pull;
    moment += pull * centre;
  }
  sums[STRETCHING] = stretching;
  sums[STRETCHING_MOMENT] = stretchingMoment;
  sums[BENDING] = bending;
  sums[FORCE] = force;
  sums[MOMENT] = moment;
}

/** Stretching stiffness A, N/m. */
export function stretchingOf(sums: Float64Array): number {
  return sums[STRETCHING] ?? 0;
}

/** Height of the neutral plane over the reference, m. */
export function neutralPlaneOf(sums: Float64Array): number {
  return (sums[STRETCHING_MOMENT] ?? 0) / (sums[STRETCHING] ?? 0);
}

/** Mean free strain over the reference strain: what the stack takes while it is held flat. */
export function meanStrainOf(sums: Float64Array): number {
  return (sums[FORCE] ?? 0) / (sums[STRETCHING] ?? 0);
}

/**
 * Bending stiffness about the neutral plane, N·m. Sums about a plane far from the neutral one lose digits here; near it none.
 */
export function bendingStiffnessOf(sums: Float64Array): number {
  return (sums[BENDING] ?? 0) - (sums[STRETCHING_MOMENT] ?? 0) * neutralPlaneOf(sums);
}

/** Growth of strain with height, 1/m, minus the curvature: the moment of the free strains over the bending stiffness. */
export function strainPerHeightOf(sums: Float64Array): number {
  return ((sums[MOMENT] ?? 0) - (sums[FORCE] ?? 0) * neutralPlaneOf(sums)) / bendingStiffnessOf(sums);
}
