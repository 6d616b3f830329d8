/** Bending stiffness of a plate, N·m: E h³/(12 (1 − ν²)), inputs checked by the caller. */
export function bendingStiffness(youngsModulus: number, thickness: number, poissonsRatio: number): number {
  return (youngsModulus * thickness ** 3) / (12 * (1 - poissonsRatio * poissonsRatio));
}
