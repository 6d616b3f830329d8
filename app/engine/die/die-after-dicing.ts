import type { DirectionalLayer } from "../directional/layer.ts";
import { directionalAverage } from "../directional/plane-stiffness.ts";
import { solveDirectionalLaminate, type DirectionalLaminateResult } from "../directional/solve-directional-laminate.ts";
import { EngineInputError } from "../errors.ts";
import { requireTemperature, requireWithin } from "../inputs.ts";
import { criticalLinearCurvature } from "../plate/critical-load.ts";
import { dieShape, type DieShape, type DieSurface } from "./die-shape.ts";

export interface DieInput {
  /** The stack that is left on the die, bottom to top: carrier and adhesive are gone. */
  layers: readonly DirectionalLayer[];
  /** Edge along x and along y, m. */
  length: number;
  width: number;
  /** K; default 25 to 260 °C in steps of 5 K. */
  temperatures?: readonly number[];
}

/** The die at one temperature: surface and shape, with the signs of the curvature. */
export interface DieAtTemperature extends DieSurface, DieShape {
  /** K */
  temperature: number;
  /** Load over the estimated load at which a free die of this size would roll; 1 at its critical size. */
  criticalShare: number;
  /** Edge, m, of the square die that would be at its critical size; null for a flat one. An estimate. */
  criticalEdge: number | null;
  /** Whether small deflections hold within some 5 %. */
  linearValid: boolean;
}

export interface DieAfterDicing {
  /** In the order of the temperatures. */
  curve: DieAtTemperature[];
  /** The temperature of the curve with the largest warp. */
  worst: DieAtTemperature;
}

/** 25 to 260 °C, the peak of a usual lead-free reflow. */
const DEFAULT_TEMPERATURES = /* @__PURE__ */ Array.from({ length: 48 }, (_, n) => 298.15 + 5 * n);

/** Share of the critical load at which a free disc departs from small deflections by 5 %: S = 0.22 of 1.43. */
const LINEAR_SHARE = 0.15;

/**
 * Warp of a free die over temperature: the wafer's own laminate at the die's size, elastic.
 *
 * Below its own critical size, the size at which it would roll, a die is well described by small deflections, and its warp
 * grows with the square of its edge; the load on it grows so too, so that linear holds up to about 0.4 of that edge. The size
 * is estimated from the criterion of a disc of equal area under the larger principal curvature; for a rectangle it is an
 * estimate, no more (own derivation). Metals that yield and solder that melts are not followed here, and within a few
 * thicknesses of the edge films relax. Attached dies do not follow it.
 * Bad input throws `EngineInputError`. Source: as `solveDirectionalLaminate`; critical size as `criticalLinearCurvature`.
 */
export function dieAfterDicing(i: DieInput): DieAfterDicing {
  const { length, width } = checkDie(i);
  const temperatures = i.temperatures ?? DEFAULT_TEMPERATURES;
  const curve = temperatures.map((temperature, n) => {
    requireTemperature(`temperatures[${n}]`, temperature);
    return dieAtTemperature(i.layers, length, width, temperature);
  });
  const [first, ...rest] = curve;
  if (!first) throw new EngineInputError("temperatures", "are missing", "at least one");
  return { curve, worst: rest.reduce((worst, next) => (next.warp > worst.warp ? next : worst), first) };
}

function checkDie({ length, width }: DieInput): { length: number; width: number } {
  return {
    length: requireWithin("length", length, 1e-5, 0.5, "m"),
    width: requireWithin("width", width, 1e-5, 0.5, "m"),
  };
}

function dieAtTemperature(
  layers: readonly DirectionalLayer[],
  length: number,
  width: number,
  temperature: number,
): DieAtTemperature {
  const solved = solveDirectionalLaminate(layers, { temperature });
  const { curvatureX, curvatureY, twist } = solved;
  const critical = criticalRadius(solved);
  const radius = Math.sqrt((length * width) / Math.PI);
  const criticalShare = critical === null ? 0 : (radius / critical) ** 2;
  return {
    temperature,
    curvatureX,
    curvatureY,
    twist,
    ...dieShape({ curvatureX, curvatureY, twist }, length, width),
    criticalShare,
    criticalEdge: critical === null ? null : Math.sqrt(Math.PI) * critical,
    linearValid: criticalShare <= LINEAR_SHARE,
  };
}

/** Radius, m, of the disc of this stack that its own curvature would just make roll; null when it is flat. */
function criticalRadius({
  principal,
  effectiveThickness,
  freeBendingStiffness,
}: DirectionalLaminateResult): number | null {
  const curvature = Math.abs(principal.major);
  if (curvature === 0) return null;
  const { poissonsRatio } = directionalAverage(freeBendingStiffness);
  // The critical curvature goes with h/R²: taken at a radius where the disc is surely a plate.
  const reference = Math.max(1e-4, 100 * effectiveThickness);
  const atReference = criticalLinearCurvature({
    radius: reference,
    thickness: effectiveThickness,
    // The ratio alone matters; the modulus does not enter a critical curvature.
    youngsModulus: 1e11,
    poissonsRatio: Math.min(Math.max(poissonsRatio, 0), 0.4999),
  });
  return reference * Math.sqrt(atReference / curvature);
}
