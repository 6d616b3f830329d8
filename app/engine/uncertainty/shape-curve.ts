import { criticalLinearCurvature } from "../plate/critical-load.ts";
import { reachedWaferShape, type PlateInput } from "../plate/free-wafer-shape.ts";
import { arcSagitta } from "../stoney/bow.ts";

/** The shape of a free disc that bends alike in both directions, as functions of its curvature by small-deflection theory. */
export interface ShapeCurve {
  /** centre to rim along the axis that bends most, m, sign of the curvature */
  sagitta(curvature: number, thickness: number): number;
  /** peak to valley, m */
  warp(curvature: number, thickness: number): number;
}

/** Nodes up to the load at which the disc rolls, and beyond it up to `FARTHEST` times that load. */
const BEFORE = 192;
const BEYOND = 1024;
const FARTHEST = 60;

/**
 * `freeWaferShape` for sampling: bows of a disc of given radius and material for any curvature (1/m) and thickness (m), read from
 * a curve through it. Without dimensions the shape depends on the load alone, κ R²/(4h), so one curve serves every draw. Within
 * 1e-4 of `freeWaferShape` (measured: 5e-5) up to 60 times the load at which the disc rolls; beyond that it is asked itself.
 * A node is solved when it is first asked for, some 1200 in all, so build it once for all steps with the same disc.
 * @throws EngineInputError as `freeWaferShape` does, for the disc
 */
export function shapeCurve(disc: Omit<PlateInput, "thickness">): ShapeCurve {
  const { radius } = disc;
  // So thin that slopes vanish: then bows over 2 h are the curvatures without dimensions.
  const thin = { ...disc, radius: 1, thickness: 1e-9 };
  const scale = 4 * thin.thickness;
  const onset = criticalLinearCurvature(thin) / scale;
  const at = (load: number) => reachedWaferShape({ ...thin, linearCurvature: load * scale });
  const major = new Float64Array(BEFORE + BEYOND + 1).fill(NaN);
  const high = major.slice();
  const solve = (n: number) => {
    const { bowMajor, warp } = at(loadAt(n) * onset);
    major[n] = (2 * bowMajor) / scale;
    high[n] = (2 * warp) / scale;
  };
  const along = (curve: Float64Array, position: number) => {
    const n = Math.floor(position);
    if (Number.isNaN(curve[n])) solve(n);
    if (Number.isNaN(curve[n + 1])) solve(n + 1);
    const below = curve[n] ?? 0;
    return below + (position - n) * ((curve[n + 1] ?? below) - below);
  };
  const asked = (curvature: number, thickness: number) =>
    reachedWaferShape({ ...disc, thickness, linearCurvature: curvature });
  return {
    sagitta(curvature, thickness) {
      const perLoad = (4 * thickness) / (radius * radius);
      const position = positionOf(Math.abs(curvature) / (perLoad * onset));
      if (!(position < BEFORE + BEYOND)) return asked(curvature, thickness).bowMajor;
      const sagitta = arcSagitta(along(major, position) * perLoad, radius);
      return curvature < 0 ? -sagitta : sagitta;
    },
    warp(curvature, thickness) {
      const perLoad = (4 * thickness) / (radius * radius);
      const position = positionOf(Math.abs(curvature) / (perLoad * onset));
      if (!(position < BEFORE + BEYOND)) return asked(curvature, thickness).warp;
      const bow = along(major, position);
      // What lies beside the arc shrinks with it, as in `freeWaferShape`.
      return bow > 0 ? (arcSagitta(bow * perLoad, radius) * along(high, position)) / bow : 0;
    },
  };
}

/** Beyond the onset the bow departs like a square root, so the nodes are even in that of the load over the onset. */
const REACH = /* @__PURE__ */ Math.sqrt(FARTHEST - 1);

function loadAt(node: number): number {
  if (node <= BEFORE) return node / BEFORE;
  const beyond = ((node - BEFORE) / BEYOND) * REACH;
  return 1 + beyond * beyond;
}

/** Place among the nodes of a load over the onset; infinite where it is no number. */
function positionOf(load: number): number {
  if (load <= 1) return load * BEFORE;
  return BEFORE + (Math.sqrt(load - 1) / REACH) * BEYOND;
}
