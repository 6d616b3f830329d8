import { at } from "../table/elements.ts";
import { backward, dot, factorise, forward } from "./dense.ts";
import { internalEnergy, linearise, type RitzPlate } from "./ritz-plate.ts";

/** A shape in equilibrium. */
export interface Equilibrium {
  shape: Float64Array;
  /** Internal energy, in units of 16π M h³/12 (h/R)². */
  energy: number;
  /** Small-deflection curvatures of the load that holds it: mean, half difference, twist, times R²/(4h). */
  load: { mean: number; halfDifference: number; twist: number };
  /** Whether the energy has a minimum there within the space and the constraints. */
  stable: boolean;
  /** With the mean curvatures held: least stiffness against a change of them, over that of a flat wafer; below 0 when unstable. */
  stiffness: number;
  /** Whether Newton's method has come to rest. */
  converged: boolean;
}

/** Mean curvatures over the area, times R²/(4h): mean of the two axes, half their difference, twist. */
export interface MeanCurvature {
  mean: number;
  halfDifference: number;
  twist?: number;
}

/** Shape of uniform curvature. */
export function uniformShape(plate: RitzPlate, { mean, halfDifference, twist = 0 }: MeanCurvature): Float64Array {
  const shape = new Float64Array(plate.size);
  shape[0] = 2 * mean;
  shape[1] = 2 * halfDifference;
  if (plate.space.uniform > 2) shape[2] = 2 * twist;
  return shape;
}

/** Forces on the coefficients under a load given as small-deflection curvatures times R²/(4h). */
export function loadVector(plate: RitzPlate, { mean, halfDifference, twist = 0 }: MeanCurvature): Float64Array {
  const forces = new Float64Array(plate.size);
  forces[0] = mean;
  forces[1] = plate.ratios.along * halfDifference;
  if (plate.space.uniform > 2) forces[2] = plate.ratios.between * twist;
  return forces;
}

const MOST_STEPS = 200;
const AT_REST = 1e-12;

/**
 * Newton's method from `start`, downhill in energy at every step. With `forces` all coefficients are free; with null the
 * uniform bends, that is the mean curvatures, stay as they are.
 */
export function settle(plate: RitzPlate, start: Float64Array, forces: Float64Array | null): Equilibrium {
  const { size } = plate;
  const held = forces ? 0 : plate.space.uniform;
  const free = size - held;
  const shape = start.slice();
  let stable = false;
  let converged = false;
  let state = linearise(plate, shape);
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const slope = new Float64Array(free);
    for (let n = 0; n < free; n += 1) slope[n] = at(state.gradient, held + n) - (forces ? at(forces, held + n) : 0);
    const { factor, shifted } = positiveFactor(state.hessian, size, held);
    stable = !shifted;
    const move = slope.map((value) => -value);
    forward(factor, free, move);
    backward(factor, free, move);
    const descent = dot(slope, move);
    const total = (trial: Float64Array) => internalEnergy(plate, trial) - (forces ? dot(forces, trial) : 0);
    const here = state.energy - (forces ? dot(forces, shape) : 0);
    const trial = shape.slice();
    let length = 1;
    for (;;) {
      for (let n = 0; n < free; n += 1) trial[held + n] = at(shape, held + n) + length * at(move, n);
      if (total(trial) <= here + 1e-4 * length * descent + 1e-13 * Math.abs(here) || length < 1e-9) break;
      length /= 2;
    }
    const moved = length * Math.sqrt(dot(move, move));
    shape.set(trial);
    state = linearise(plate, shape);
    if (moved <= AT_REST * (1 + Math.sqrt(dot(shape, shape)))) {
      converged = !shifted;
      break;
    }
  }
  return {
    shape,
    energy: state.energy,
    load: {
      mean: at(state.gradient, 0),
      halfDifference: at(state.gradient, 1) / plate.ratios.along,
      twist: plate.space.uniform > 2 ? at(state.gradient, 2) / plate.ratios.between : 0,
    },
    stable,
    stiffness: held > 0 ? heldStiffness(state.hessian, size, held, plate.ratios.along) : Number.NaN,
    converged,
  };
}

/** Least eigenvalue of the Hessian by A and B once everything else has given way: its Schur complement. */
function heldStiffness(hessian: Float64Array, size: number, held: number, tau: number): number {
  const { factor } = positiveFactor(hessian, size, held);
  const free = size - held;
  const columns = [0, 1].map((c) => {
    const column = Float64Array.from({ length: free }, (_, n) => at(hessian, (held + n) * size + c));
    forward(factor, free, column);
    return column;
  });
  const [first, second] = columns;
  if (!first || !second) throw new RangeError("two columns");
  // Coefficient 0 is 2 A, coefficient 1 is 2 B; a flat wafer resists with 1/2 and τ/2.
  const aa = 2 * (at(hessian, 0) - dot(first, first));
  const ab = (2 * (at(hessian, 1) - dot(first, second))) / Math.sqrt(tau);
  const bb = (2 * (at(hessian, size + 1) - dot(second, second))) / tau;
  return (aa + bb - Math.hypot(aa - bb, 2 * ab)) / 2;
}

/** Cholesky factor of the free block of the Hessian, of the diagonal raised as far as it takes when it is not positive. */
function positiveFactor(hessian: Float64Array, size: number, held: number): { factor: Float64Array; shifted: boolean } {
  const free = size - held;
  for (let shift = 0; ; shift = shift === 0 ? 1e-3 : shift * 4) {
    const factor = new Float64Array(free * free);
    for (let i = 0; i < free; i += 1) {
      for (let j = 0; j <= i; j += 1) factor[i * free + j] = at(hessian, (held + i) * size + held + j);
      factor[i * free + i] = at(factor, i * free + i) + shift;
    }
    if (factorise(factor, free)) return { factor, shifted: shift > 0 };
  }
}
