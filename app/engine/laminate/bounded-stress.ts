import { newColumn } from "./column.ts";
import type { PlacedLayers } from "./placed-layers.ts";
import type { LaminateBalance, SlidingPlate } from "./solve-laminate.ts";

/**
 * Limits of the mean stress of every layer of a stack, Pa, `low` not above `high`; infinite for a layer that stays elastic. Beyond
 * them it flows without carrying more.
 */
export interface StressBounds {
  low: Float64Array;
  high: Float64Array;
}

/** Strain of the stack: at its neutral plane, and its growth per height. */
interface PlaneStrain {
  mean: number;
  perHeight: number;
}

interface Problem {
  layers: PlacedLayers;
  bounds: StressBounds;
  neutralPlane: number;
  heldFlat: boolean;
  slidingOn: SlidingPlate | undefined;
}

const MOST_STEPS = 200;

/**
 * Flow strain of each layer, to be added to its free strain, such that no mean stress passes its limits and the stack is in
 * balance; null when the elastic stack already keeps them. `heldFlat` balances forces alone, curvature zero; `slidingOn` is a
 * plate that `elastic` was balanced with.
 *
 * Stress limited from both sides derives from a convex energy of the two numbers that describe the strain, so the answer is
 * unique. Newton's method on the set of layers that flow, each step cut where the energy stops falling, ends exactly as soon as
 * that set stays the same; 60 flowing films take about five steps. The flow strain is the same through the layer.
 * Source: associated flow of an elastic, perfectly plastic layer, Simo and Hughes 1998, chapter 2, from memory; solution by
 * own derivation.
 */
export function flowStrains(
  layers: PlacedLayers,
  bounds: StressBounds,
  elastic: LaminateBalance,
  { heldFlat, slidingOn }: { heldFlat: boolean; slidingOn?: SlidingPlate | undefined },
): Float64Array | null {
  const problem: Problem = { layers, bounds, neutralPlane: elastic.neutralPlane, heldFlat, slidingOn };
  let strain: PlaneStrain = {
    mean: elastic.midplaneStrain - elastic.curvature * elastic.neutralPlane,
    perHeight: heldFlat ? 0 : -elastic.curvature,
  };
  if (keepsLimits(problem, strain)) return null;
  const zones = new Int8Array(layers.count);
  for (let step = 0; step < MOST_STEPS; step += 1) {
    noteZones(problem, strain, zones);
    const target = newtonTarget(problem, zones);
    if (isSettled(problem, strain, target, zones)) {
      strain = target;
      break;
    }
    strain = stopShort(problem, strain, target);
  }
  const flow = newColumn(layers.count);
  for (let n = 0; n < layers.count; n += 1) {
    const trial = trialStress(problem, n, strain);
    flow[n] = (trial - clip(bounds, n, trial)) / (layers.biaxialModulus[n] ?? 1);
  }
  return flow;
}

function trialStress({ layers, neutralPlane }: Problem, n: number, { mean, perHeight }: PlaneStrain): number {
  const strain = mean + perHeight * ((layers.centre[n] ?? 0) - neutralPlane) - (layers.freeStrain[n] ?? 0);
  return (layers.biaxialModulus[n] ?? 0) * strain;
}

/** Stiffness of a layer, M f h, N/m. */
function stiffnessOf({ coveredModulus, thickness }: PlacedLayers, n: number): number {
  return (coveredModulus[n] ?? 0) * (thickness[n] ?? 0);
}

function clip({ low, high }: StressBounds, n: number, stress: number): number {
  const least = low[n] ?? -Infinity;
  const most = high[n] ?? Infinity;
  return stress < least ? least : stress > most ? most : stress;
}

/** Share of a limit that counts as rounding, so that a layer left at its limit does not flow by the last digit. */
const ROUNDING = 1e-12;

function keepsLimits(problem: Problem, strain: PlaneStrain): boolean {
  const { layers, bounds } = problem;
  for (let n = 0; n < layers.count; n += 1) {
    const low = bounds.low[n] ?? -Infinity;
    const high = bounds.high[n] ?? Infinity;
    if (low === -Infinity && high === Infinity) continue;
    const stress = trialStress(problem, n, strain);
    if (!(stress >= low - ROUNDING * Math.abs(low) && stress <= high + ROUNDING * Math.abs(high))) return false;
  }
  return true;
}

/** −1 and 1 for a layer that flows at its lower and upper limit, 0 for one that is elastic. */
function zoneOf(problem: Problem, n: number, strain: PlaneStrain): number {
  const { low, high } = problem.bounds;
  const stress = trialStress(problem, n, strain);
  return stress < (low[n] ?? -Infinity) ? -1 : stress > (high[n] ?? Infinity) ? 1 : 0;
}

function noteZones(problem: Problem, strain: PlaneStrain, zones: Int8Array): void {
  for (let n = 0; n < problem.layers.count; n += 1) zones[n] = zoneOf(problem, n, strain);
}

/** Strain that balances the stack while the layers that flow now keep flowing. */
function newtonTarget({ layers, bounds, neutralPlane, heldFlat, slidingOn }: Problem, zones: Int8Array): PlaneStrain {
  let a = 0;
  let b = 0;
  let d = 0;
  let force = 0;
  let moment = 0;
  for (let n = 0; n < layers.count; n += 1) {
    const z = (layers.centre[n] ?? 0) - neutralPlane;
    const thickness = layers.thickness[n] ?? 0;
    const stiffness = stiffnessOf(layers, n);
    const zone = zones[n] ?? 0;
    // The bending of the layer about its own middle stays elastic whether it flows or not.
    d += (stiffness * (thickness * thickness)) / 12;
    if (zone === 0) {
      const pull = stiffness * (layers.freeStrain[n] ?? 0);
      a += stiffness;
      b += stiffness * z;
      d += stiffness * z * z;
      force += pull;
      moment += pull * z;
    } else {
      const limit = (zone === 1 ? bounds.high[n] : bounds.low[n]) ?? 0;
      const load = (stiffness * limit) / (layers.biaxialModulus[n] ?? 1);
      force -= load;
      moment -= load * z;
    }
  }
  if (slidingOn) {
    d += slidingOn.bendingStiffness;
    moment -= slidingOn.bendingStiffness * slidingOn.curvature;
  }
  if (heldFlat) return { mean: force / a, perHeight: 0 };
  const shift = b / a;
  const perHeight = (moment - shift * force) / (d - shift * b);
  return { mean: (force - b * perHeight) / a, perHeight };
}

/** Whether the same layers flow at the target, or it has not moved. */
function isSettled(problem: Problem, strain: PlaneStrain, target: PlaneStrain, zones: Int8Array): boolean {
  const { count, total } = problem.layers;
  const moved = Math.abs(target.mean - strain.mean) + Math.abs(target.perHeight - strain.perHeight) * total;
  if (moved < 1e-15) return true;
  for (let n = 0; n < count; n += 1) if (zoneOf(problem, n, target) !== zones[n]) return false;
  return true;
}

/** Share of the work at its start that a step along the way may leave: enough for the energy to fall, cheap to find. */
const WORK_LEFT = 0.1;

/** The way to the target, cut near where the energy is least along it: where force and moment do no more work. */
function stopShort(problem: Problem, from: PlaneStrain, to: PlaneStrain): PlaneStrain {
  const way = { mean: to.mean - from.mean, perHeight: to.perHeight - from.perHeight };
  if (work(problem, to, way) <= 0) return to;
  const enough = WORK_LEFT * Math.abs(work(problem, from, way));
  let low = 0;
  let high = 1;
  let cut = from;
  for (let n = 0; n < 60; n += 1) {
    const middle = (low + high) / 2;
    cut = along(from, way, middle);
    const left = work(problem, cut, way);
    if (Math.abs(left) <= enough) break;
    if (left > 0) high = middle;
    else low = middle;
  }
  return cut;
}

function along(from: PlaneStrain, way: PlaneStrain, share: number): PlaneStrain {
  return { mean: from.mean + share * way.mean, perHeight: from.perHeight + share * way.perHeight };
}

/** Change of the stack's energy per unit of the way, J/m2: force times mean strain and moment times strain per height. */
function work(problem: Problem, strain: PlaneStrain, way: PlaneStrain): number {
  const { layers, bounds, neutralPlane, slidingOn } = problem;
  let force = 0;
  let moment = slidingOn ? slidingOn.bendingStiffness * (strain.perHeight + slidingOn.curvature) : 0;
  for (let n = 0; n < layers.count; n += 1) {
    const thickness = layers.thickness[n] ?? 0;
    const stiffness = stiffnessOf(layers, n);
    const stress = clip(bounds, n, trialStress(problem, n, strain));
    const pull = (stiffness / (layers.biaxialModulus[n] ?? 1)) * stress;
    force += pull;
    moment +=
      pull * ((layers.centre[n] ?? 0) - neutralPlane) + stiffness * ((thickness * thickness) / 12) * strain.perHeight;
  }
  return force * way.mean + moment * way.perHeight;
}
