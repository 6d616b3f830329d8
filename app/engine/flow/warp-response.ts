import type { BlockModel } from "../uncertainty/model.ts";
import { shapeCurve, type ShapeCurve } from "../uncertainty/shape-curve.ts";
import type { FlowInput } from "./model.ts";
import { movedWalk, nominalWalk, type ReadStep } from "./moved-walks.ts";
import type { LyingShape } from "./shape.ts";
import { peakShape, roomShape } from "./step.ts";
import { firstTouched, type Unknown } from "./unknowns.ts";

/** When a wafer lies on the tool of a step with a shape of its own: at 25 °C as it leaves, or at the hottest. */
export const MOMENTS = ["atRoom", "atPeak"] as const;
export type Moment = (typeof MOMENTS)[number];

/** Figures of a shape that a response is made of, and what does not change with the inputs. */
interface Read {
  /** 1/m, and m; both null where the two directions differ, whose warp is taken as it is */
  curvature: number;
  thickness: number;
  /** warp, m, with the sign of the curvature */
  warp: number;
  unequal: boolean;
  shape: LyingShape;
}

/** Warp of a step, m, positive for a bowl, as a function of deviations of some unknowns from their best values, SI. */
export interface WarpResponse {
  nominal: number;
  /** places of the unknowns that move it, in the order of the model's inputs */
  uses: number[];
  model: BlockModel;
}

type Response = Record<Moment, WarpResponse | null>;

/**
 * How the warp of every step answers to the unknowns of a flow, quickly enough to be drawn tens of thousands of times: curvature and
 * effective thickness as a sum of parabolas, one for each unknown, through the walk as stated and the walks with that unknown at both
 * ends of its interval; then the shape of a free disc with them, buckling included. Where the two directions differ, the parabolas
 * are those of the warp itself. What two unknowns do together beyond the sum of both is left out: see `sampledWarps` for the error.
 * A side that cannot be computed leaves a straight line through the other. The inputs of each model are deviations.
 * @throws EngineInputError when the flow as stated cannot be walked
 */
export function warpResponses(flow: FlowInput, unknowns: readonly Unknown[]): Response[] {
  const nominal = nominalWalk(flow, readMoments);
  const curves = curveMaker(flow);
  const parts = nominal.readings.map(() => ({ atRoom: [] as Part[], atPeak: [] as Part[] }));
  for (const [place, unknown] of unknowns.entries()) {
    const reach = unknown.measured.tolerance ?? 0;
    const first = firstTouched(unknown);
    const up = movedWalk(flow, nominal, unknown, reach, readMoments);
    const down = movedWalk(flow, nominal, unknown, -reach, readMoments);
    for (const [index, stated] of nominal.readings.entries())
      for (const moment of MOMENTS) {
        const at = stated[moment];
        // A walk that has come back to the nominal wafer ends early.
        const side = (walk: Reading[] | null) => (walk ? (walk[index - first] ?? stated)[moment] : null);
        if (at && index >= first) parts[index]?.[moment].push(...partOf(place, reach, at, side(up), side(down)));
      }
  }
  return nominal.readings.map((stated, index) => ({
    atRoom: stated.atRoom && responseOf(stated.atRoom, parts[index]?.atRoom ?? [], curves),
    atPeak: stated.atPeak && responseOf(stated.atPeak, parts[index]?.atPeak ?? [], curves),
  }));
}

type Reading = Record<Moment, Read | null>;

const readMoments: ReadStep<Reading> = (wafer, walked) => ({
  atRoom: readShape(roomShape(wafer, walked)),
  atPeak: readShape(peakShape(wafer, walked)),
});

function readShape(shape: LyingShape | null): Read | null {
  if (!shape) return null;
  const { linearCurvature: curvature, disc, unequal, warp, sagitta } = shape;
  return {
    curvature,
    thickness: disc.thickness,
    warp: Math.sign(sagitta) * warp,
    unequal: unequal !== undefined,
    shape,
  };
}

/** Line and parabola of one unknown, for each of the figures. */
interface Part {
  place: number;
  curvature: Parabola;
  thickness: Parabola;
  warp: Parabola;
}

interface Parabola {
  line: number;
  bend: number;
}

function partOf(place: number, reach: number, at: Read, up: Read | null, down: Read | null): Part[] {
  const through = (figure: "curvature" | "thickness" | "warp"): Parabola => {
    const [high, low] = [up && up[figure] - at[figure], down && down[figure] - at[figure]];
    if (high === null || low === null) return { line: ((high ?? 0) - (low ?? 0)) / reach, bend: 0 };
    return { line: (high - low) / (2 * reach), bend: (high + low) / (2 * reach * reach) };
  };
  const part = { place, curvature: through("curvature"), thickness: through("thickness"), warp: through("warp") };
  const moves = [part.curvature, part.thickness, part.warp].some(({ line, bend }) => line !== 0 || bend !== 0);
  return moves ? [part] : [];
}

/** Curves through the shapes of the flow's discs: a pair lacks the crystal's axes, so there are two at most. */
function curveMaker({ wafer }: FlowInput): (shape: LyingShape) => ShapeCurve {
  const known = new Map<string, ShapeCurve>();
  return ({ disc: { youngsModulus, poissonsRatio, crystal } }) => {
    const key = crystal ?? "none";
    const curve = known.get(key) ?? shapeCurve({ radius: wafer.diameter / 2, youngsModulus, poissonsRatio, crystal });
    known.set(key, curve);
    return curve;
  };
}

function responseOf(at: Read, parts: readonly Part[], curves: (shape: LyingShape) => ShapeCurve): WarpResponse {
  const coefficients = (figure: "curvature" | "thickness" | "warp") => ({
    best: at[figure],
    line: Float64Array.from(parts, (part) => part[figure].line),
    bend: Float64Array.from(parts, (part) => part[figure].bend),
  });
  const count = parts.length;
  const figures = { curvature: coefficients("curvature"), thickness: coefficients("thickness") };
  const warp = coefficients("warp");
  const curve = at.unequal ? null : curves(at.shape);
  return {
    nominal: at.warp,
    uses: parts.map(({ place }) => place),
    model: {
      inputs: count,
      evaluate(inputs, rows, out) {
        for (let row = 0; row < rows; row += 1) {
          if (!curve) {
            out[row] = sumOf(warp, inputs, row * count, count);
            continue;
          }
          const curvature = sumOf(figures.curvature, inputs, row * count, count);
          const thickness = sumOf(figures.thickness, inputs, row * count, count);
          out[row] = Math.sign(curvature) * curve.warp(curvature, thickness);
        }
      },
    },
  };
}

function sumOf(
  { best, line, bend }: { best: number; line: Float64Array; bend: Float64Array },
  inputs: Float64Array,
  from: number,
  count: number,
): number {
  let sum = best;
  for (let n = 0; n < count; n += 1) {
    const by = inputs[from + n] ?? 0;
    sum += by * ((line[n] ?? 0) + by * (bend[n] ?? 0));
  }
  return sum;
}
