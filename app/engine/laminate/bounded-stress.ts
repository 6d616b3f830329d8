import type { PlacedLayer } from "./placed-layers.ts";
import type { LaminateBalance, SlidingPlate } from "./solve-laminate.ts";

/** Limits of the mean stress of one layer, Pa, `low` not above `high`. Beyond them it flows without carrying more. */
export interface StressBound {
  layer: PlacedLayer;
  low: number;
  high: number;
}

/** Strain of the stack: at its neutral plane, and its growth per height. */
interface PlaneStrain {
  mean: number;
  perHeight: number;
}

interface Problem {
  layers: readonly PlacedLayer[];
  bounds: readonly StressBound[];
  neutralPlane: number;
  heldFlat: boolean;
  slidingOn: SlidingPlate | undefined;
}

const MOST_STEPS = 200;

/**
 * Flow strain of each bound, to be added to the free strain of its layer, such that no mean stress passes its limits and the
 * stack is in balance; null when the elastic stack already keeps them. `heldFlat` balances forces alone, curvature zero;
 * `slidingOn` is a plate that `elastic` was balanced with.
 *
 * Stress limited from both sides derives from a convex energy of the two numbers that describe the strain, so the answer is
 * unique. Newton's method on the set of layers that flow, each step cut where the energy stops falling, ends exactly as soon as
 * that set stays the same; 60 flowing films take about five steps. The flow strain is the same through the layer.
 * Source: associated flow of an elastic, perfectly plastic layer, Simo and Hughes 1998, chapter 2, from memory; solution by
 * own derivation.
 */
export function flowStrains(
  layers: readonly PlacedLayer[],
  bounds: readonly StressBound[],
  elastic: LaminateBalance,
  { heldFlat, slidingOn }: { heldFlat: boolean; slidingOn?: SlidingPlate | undefined },
): number[] | null {
  const problem: Problem = { layers, bounds, neutralPlane: elastic.neutralPlane, heldFlat, slidingOn };
  let strain: PlaneStrain = {
    mean: elastic.midplaneStrain - elastic.curvature * elastic.neutralPlane,
    perHeight: heldFlat ? 0 : -elastic.curvature,
  };
  if (bounds.every((bound) => keepsLimits(problem, bound, strain))) return null;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const { target, settled } = newtonTarget(problem, strain);
    if (settled) {
      strain = target;
      break;
    }
    strain = stopShort(problem, strain, target);
  }
  return bounds.map((bound) => {
    const trial = trialStress(problem, bound.layer, strain);
    return (trial - clip(trial, bound)) / bound.layer.biaxialModulus;
  });
}

function trialStress({ neutralPlane }: Problem, l: PlacedLayer, { mean, perHeight }: PlaneStrain): number {
  return l.biaxialModulus * (mean + perHeight * (l.centre - neutralPlane) - l.freeStrain);
}

function clip(stress: number, { low, high }: StressBound): number {
  return stress < low ? low : stress > high ? high : stress;
}

/** Share of a limit that counts as rounding, so that a layer left at its limit does not flow by the last digit. */
const ROUNDING = 1e-12;

function keepsLimits(problem: Problem, { layer, low, high }: StressBound, strain: PlaneStrain): boolean {
  const stress = trialStress(problem, layer, strain);
  return stress >= low - ROUNDING * Math.abs(low) && stress <= high + ROUNDING * Math.abs(high);
}

/** −1 and 1 for a layer that flows at its lower and upper limit, 0 for one that is elastic. */
function zoneOf(problem: Problem, bound: StressBound, strain: PlaneStrain): number {
  const stress = trialStress(problem, bound.layer, strain);
  return stress < bound.low ? -1 : stress > bound.high ? 1 : 0;
}

/** Strain that balances the stack while the layers that flow now keep flowing; `settled` when the same ones flow there. */
function newtonTarget(problem: Problem, strain: PlaneStrain): { target: PlaneStrain; settled: boolean } {
  const { layers, bounds, neutralPlane, heldFlat } = problem;
  let [a, b, d, force, moment] = [0, 0, 0, 0, 0];
  for (const l of layers) {
    const z = l.centre - neutralPlane;
    a += l.stiffness;
    b += l.stiffness * z;
    d += l.stiffness * ((l.thickness * l.thickness) / 12 + z * z);
    force += l.stiffness * l.freeStrain;
    moment += l.stiffness * l.freeStrain * z;
  }
  if (problem.slidingOn) {
    d += problem.slidingOn.bendingStiffness;
    moment -= problem.slidingOn.bendingStiffness * problem.slidingOn.curvature;
  }
  const zones = bounds.map((bound) => zoneOf(problem, bound, strain));
  bounds.forEach((bound, n) => {
    const zone = zones[n];
    const l = bound.layer;
    if (zone === 0) return;
    const z = l.centre - neutralPlane;
    const limit = zone === 1 ? bound.high : bound.low;
    // Out goes the elastic answer of the layer, in comes its limit; its own bending stays elastic.
    a -= l.stiffness;
    b -= l.stiffness * z;
    d -= l.stiffness * z * z;
    const load = l.stiffness * (l.freeStrain + limit / l.biaxialModulus);
    force -= load;
    moment -= load * z;
  });
  const target = solveBalance({ a, b, d, force, moment }, heldFlat);
  const moved = Math.abs(target.mean - strain.mean) + Math.abs(target.perHeight - strain.perHeight) * span(layers);
  const settled = moved < 1e-15 || bounds.every((bound, n) => zoneOf(problem, bound, target) === zones[n]);
  return { target, settled };
}

function solveBalance(
  s: { a: number; b: number; d: number; force: number; moment: number },
  heldFlat: boolean,
): PlaneStrain {
  if (heldFlat) return { mean: s.force / s.a, perHeight: 0 };
  const shift = s.b / s.a;
  const perHeight = (s.moment - shift * s.force) / (s.d - shift * s.b);
  return { mean: (s.force - s.b * perHeight) / s.a, perHeight };
}

function span(layers: readonly PlacedLayer[]): number {
  return layers.reduce((sum, l) => sum + l.thickness, 0);
}

/** The way to the target, cut where the energy is least along it: where force and moment do no more work. */
function stopShort(problem: Problem, from: PlaneStrain, to: PlaneStrain): PlaneStrain {
  const way = { mean: to.mean - from.mean, perHeight: to.perHeight - from.perHeight };
  const at = (t: number): PlaneStrain => ({
    mean: from.mean + t * way.mean,
    perHeight: from.perHeight + t * way.perHeight,
  });
  let [low, high] = [0, 1];
  if (work(problem, at(1), way) <= 0) return at(1);
  for (let n = 0; n < 60 && high - low > 1e-12; n += 1) {
    const middle = (low + high) / 2;
    if (work(problem, at(middle), way) > 0) high = middle;
    else low = middle;
  }
  return at((low + high) / 2);
}

/** Change of the stack's energy per unit of the way, J/m2: force times mean strain and moment times strain per height. */
function work(problem: Problem, strain: PlaneStrain, way: PlaneStrain): number {
  const { layers, bounds, neutralPlane, slidingOn } = problem;
  let force = 0;
  let moment = slidingOn ? slidingOn.bendingStiffness * (strain.perHeight + slidingOn.curvature) : 0;
  for (const l of layers) {
    const z = l.centre - neutralPlane;
    const pull = (l.stiffness / l.biaxialModulus) * trialStress(problem, l, strain);
    force += pull;
    moment += pull * z + l.stiffness * ((l.thickness * l.thickness) / 12) * strain.perHeight;
  }
  for (const bound of bounds) {
    const l = bound.layer;
    const trial = trialStress(problem, l, strain);
    const over = (l.stiffness / l.biaxialModulus) * (clip(trial, bound) - trial);
    force += over;
    moment += over * (l.centre - neutralPlane);
  }
  return force * way.mean + moment * way.perHeight;
}
