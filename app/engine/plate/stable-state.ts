import { stretchEnergy, type PlateEnergy, type StretchEnergy } from "./plate-energy.ts";

/** Mean and half difference of two curvatures along x and y, times R²/(4h): of a load by small-deflection theory, or of a shape. */
export interface CurvaturePair {
  mean: number;
  halfDifference: number;
}

/** A shape at rest, by its mean curvatures over the area; both parts zero or more. */
export interface RestingState extends CurvaturePair {
  /** Whether the energy has a minimum there against changes of the two parts. */
  stable: boolean;
}

const stretch: StretchEnergy = { value: 0, x: 0, y: 0, xx: 0, xy: 0, yy: 0 };
const MOST_STEPS = 100;
/** A step this small, over the shape's size, ends the search at once; one whose square is, when steps are shrinking fast. */
const AT_REST = 1e-13;

/** Internal energy of mean curvatures, in units of 16π (M h³/12) (h/R)². */
export function innerEnergy(plate: PlateEnergy, { mean, halfDifference }: CurvaturePair): number {
  const [X, Y] = [mean * mean, halfDifference * halfDifference];
  stretchEnergy(plate, X, Y, stretch);
  return X + plate.tau * Y + stretch.value;
}

/** The same less the work of a load. */
export function totalEnergy(plate: PlateEnergy, shape: CurvaturePair, load: CurvaturePair): number {
  const work = shape.mean * load.mean + plate.tau * shape.halfDifference * load.halfDifference;
  return innerEnergy(plate, shape) - 2 * work;
}

/**
 * Nearest minimum of the energy downhill from `start`, by Newton's method with the step cut while the energy rises.
 *
 * The parts of the shape are zero or more. A part of the load below zero pushes against the shape's, as it does on one that has
 * snapped through or has rolled about the other axis: when that part of the shape dwindles to nothing there is no such shape,
 * and `stable` is false.
 */
export function settleState(plate: PlateEnergy, load: CurvaturePair, start: CurvaturePair): RestingState {
  const { tau } = plate;
  const [a0, b0] = [load.mean, load.halfDifference];
  let [a, b] = [start.mean, start.halfDifference];
  const energyAt = (mean: number, half: number): number => {
    stretchEnergy(plate, mean * mean, half * half, stretch);
    return (mean * mean + tau * half * half + stretch.value) / 2 - a0 * mean - tau * b0 * half;
  };
  let energy = energyAt(a, b);
  let before = 0;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const size = a + b;
    if ((a0 < 0 && a < 1e-3 * size) || (b0 < 0 && b < 1e-3 * size))
      return { mean: a, halfDifference: b, stable: false };
    const slopeA = a * (1 + stretch.x) - a0;
    const slopeB = b * (tau + stretch.y) - tau * b0;
    const hAB = 2 * a * b * stretch.xy;
    let hAA = 1 + stretch.x + 2 * a * a * stretch.xx;
    let hBB = tau + stretch.y + 2 * b * b * stretch.yy;
    // Where the energy curves downwards, the step follows its slope.
    const lift = 1.5 * Math.max(0, 1e-3 - smallestEigenvalue(hAA, hAB, hBB));
    hAA += lift;
    hBB += lift;
    const determinant = hAA * hBB - hAB * hAB;
    const stepA = (hAB * slopeB - hBB * slopeA) / determinant;
    const stepB = (hAB * slopeA - hAA * slopeB) / determinant;
    let share = Math.min(1, (0.5 * size + 0.2) / (Math.abs(stepA) + Math.abs(stepB)));
    // A part held against its load never steps to zero in one go: it would miss its minimum.
    if (a0 < 0 && stepA < 0) share = Math.min(share, (0.5 * a) / -stepA);
    if (b0 < 0 && stepB < 0) share = Math.min(share, (0.5 * b) / -stepB);
    let [nextA, nextB, nextEnergy] = [a, b, energy];
    for (;;) {
      nextA = Math.abs(a + share * stepA);
      nextB = Math.abs(b + share * stepB);
      nextEnergy = energyAt(nextA, nextB);
      if (nextEnergy <= energy + 1e-15 * Math.abs(energy) || !(share >= 1e-4)) break;
      share /= 3;
    }
    const moved = Math.abs(nextA - a) + Math.abs(nextB - b);
    [a, b, energy] = [nextA, nextB, nextEnergy];
    const shrinking = moved < 0.1 * before;
    before = moved;
    if (moved <= (shrinking ? Math.sqrt(AT_REST) : AT_REST) * (1 + size)) break;
  }
  const hAA = 1 + stretch.x + 2 * a * a * stretch.xx;
  const hBB = tau + stretch.y + 2 * b * b * stretch.yy;
  return { mean: a, halfDifference: b, stable: smallestEigenvalue(hAA, 2 * a * b * stretch.xy, hBB) > 0 };
}

function smallestEigenvalue(aa: number, ab: number, bb: number): number {
  return (aa + bb - Math.hypot(aa - bb, 2 * ab)) / 2;
}
