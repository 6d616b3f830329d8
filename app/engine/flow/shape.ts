import type { Layer } from "../laminate/layer.ts";
import type { LaminateBalance } from "../laminate/solve-laminate.ts";
import { reachedWaferShape, type FreeWaferShapeInput } from "../plate/free-wafer-shape.ts";
import { nearestAxes } from "../silicon/nearest-axes.ts";
import type { FaceUp, ShapeRegime, ShapeWord } from "../vocabulary.ts";
import { waferConstants } from "./silicon.ts";
import type { UnequalCurvature } from "./unequal.ts";
import type { FlowInput } from "./model.ts";

/** Shape of a wafer or pair that lies free, device side up sign (a sagitta has the sign of the curvature). */
export interface LyingShape {
  temperature: number;
  /** curvature of the linear laminate along the axis that bends most, 1/m, positive for a bowl */
  linearCurvature: number;
  /** the same with both directions apart, where they differ */
  unequal?: UnequalCurvature;
  /** centre to rim along the more curved axis, m, positive for a bowl */
  sagitta: number;
  /** the same along the axis across */
  sagittaMinor: number;
  /** peak to valley, m */
  warp: number;
  regime: ShapeRegime;
  /** load over the load at which it rolls about one axis */
  stabilityRatio: number;
  rollRadius: number | null;
  /** what it was computed from: the laminate, built when it is asked for, and the disc */
  layers: Layer[];
  /** the carriers that slide on these layers, a plate each; absent where none does */
  slidingOn?: Layer[];
  disc: FreeWaferShapeInput;
}

/** A solved laminate of the flow's wafer. */
export interface SolvedStack {
  layers: () => Layer[];
  solution: LaminateBalance;
  temperature: number;
  bonded: boolean;
  slidingOn?: Layer[] | undefined;
  unequal?: UnequalCurvature | undefined;
}

/** Shape of a solved laminate as a free disc of the flow's wafer. */
export function lyingShape(
  wafer: FlowInput["wafer"],
  { layers, solution, temperature, bonded, slidingOn, unequal }: SolvedStack,
): LyingShape {
  const { youngsModulus, poissonsRatio } = waferConstants(wafer.orientation);
  const disc: FreeWaferShapeInput = {
    radius: wafer.diameter / 2,
    thickness: unequal?.effectiveThickness ?? solution.effectiveThickness,
    youngsModulus,
    poissonsRatio,
    linearCurvature: unequal ? { x: unequal.principal.major, y: unequal.principal.minor } : solution.curvature,
    // The crystal's preferred axes matter for silicon alone; a pair is governed by its isotropic partner too.
    crystal: bonded || wafer.orientation !== "100" ? undefined : "100",
    ...(unequal && { axes: nearestAxes(unequal.principal.angle) }),
  };
  const shape = reachedWaferShape(disc);
  return {
    temperature,
    linearCurvature: unequal?.principal.major ?? solution.curvature,
    ...(unequal ? { unequal } : {}),
    sagitta: shape.bowMajor,
    sagittaMinor: shape.bowMinor,
    warp: shape.warp,
    regime: shape.regime,
    stabilityRatio: shape.stabilityRatio,
    rollRadius: shape.rollRadius,
    get layers() {
      return layers();
    },
    ...(slidingOn ? { slidingOn } : {}),
    disc,
  };
}

/** Whether the rim lies above the centre on the tool: a bowl does with its device side up, a dome with its back side up. */
export function edgesUp(shape: LyingShape, faceUp: FaceUp): boolean {
  return shape.sagitta > 0 === (faceUp === "device side");
}

/** The one word for how it lies on the tool. */
export function shapeWord(shape: LyingShape | null, faceUp: FaceUp, flatWithin: number): ShapeWord {
  if (shape === null) return "held";
  if (shape.regime === "curled") return "rolls up";
  if (shape.warp <= flatWithin) return "flat";
  if (shape.sagitta * shape.sagittaMinor < 0 && Math.abs(shape.sagittaMinor) > flatWithin) return "saddle";
  return edgesUp(shape, faceUp) ? "edges up" : "edges down";
}
