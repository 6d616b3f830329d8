import type { PlacedLayers } from "#app/engine/laminate/placed-layers.ts";

/** Placed layers one by one; `stiffness` is modulus times area fraction times thickness, N/m. */
export function layerRows(placed: PlacedLayers) {
  const { thickness, biaxialModulus, coveredModulus, centre, freeStrain } = placed;
  return Array.from(thickness, (height, n) => ({
    thickness: height,
    biaxialModulus: biaxialModulus[n] ?? NaN,
    stiffness: (coveredModulus[n] ?? NaN) * height,
    centre: centre[n] ?? NaN,
    freeStrain: freeStrain[n] ?? NaN,
  }));
}
