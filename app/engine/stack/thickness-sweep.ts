import { EngineInputError } from "../errors.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { criticalLinearCurvature } from "../plate/critical-load.ts";
import { freeWaferShape, shapeRegime } from "../plate/free-wafer-shape.ts";
import { bowFromCurvature } from "../stoney/bow.ts";
import { laminateInputValues, laminateModel } from "../uncertainty/laminate-model.ts";
import { shapeCurve, type ShapeCurve } from "../uncertainty/shape-curve.ts";
import type { ShapeRegime } from "../vocabulary.ts";
import { atItsTemperature, freeDisc, thinFilmCurvature, type StackDisc } from "./estimate-stack.ts";
import { laminateOfStack } from "./laminate-of-stack.ts";
import { withThickness, type StackInput } from "./model.ts";

/** One point of the curve warp against remaining silicon. */
export interface SweepPoint {
  thickness: number;
  warp: number;
  /** size of Stoney's bow, for comparison */
  linearWarp: number;
  regime: ShapeRegime;
}

/**
 * Warp of the free wafer over a range of silicon thickness (m), at `points` thicknesses spaced evenly on a logarithmic scale.
 * For a chart that follows every keystroke: the laminate is compiled once, and the shape is read from `shapeCurve`, so a warp is
 * within 1e-4 of that of `estimateStack`. With a film in lines each point is that of `estimateStack` itself.
 * @throws EngineInputError when the range is empty or fewer than two points are asked
 */
export function thicknessSweep(stack: StackInput, range: { from: number; to: number; points: number }): SweepPoint[] {
  const { from, to, points } = range;
  if (!(from > 0) || !(to > from))
    throw new EngineInputError("sweep", "the range of thickness is empty", "0 m < from < to");
  if (!Number.isInteger(points) || points < 2 || points > 500)
    throw new EngineInputError("sweep.points", "the number of points is out of range", "2 to 500");
  const thicknesses = Array.from({ length: points }, (_, index) =>
    index === points - 1 ? to : from * (to / from) ** (index / (points - 1)),
  );
  const { disc, unequal } = freeDisc(withThickness(stack, to));
  const pulling = atItsTemperature(stack);
  const linearWarp = (thickness: number) =>
    Math.abs(
      bowFromCurvature({ curvature: thinFilmCurvature(withThickness(pulling, thickness)), radius: disc.radius }),
    );
  if (unequal)
    return thicknesses.map((thickness) => {
      const { warp, regime } = freeWaferShape(freeDisc(withThickness(stack, thickness)).disc);
      return { thickness, warp, linearWarp: linearWarp(thickness), regime };
    });
  const layers = laminateOfStack(withThickness(stack, to));
  const place = layers.findIndex(({ cte }) => cte === "silicon");
  const curve = siliconCurve(disc);
  const inputs = Float64Array.from(laminateInputValues(layers));
  const warp = new Float64Array(1);
  let regime: ShapeRegime = "linear";
  const model = laminateModel(layers, { temperature: stack.temperature ?? ROOM_TEMPERATURE }).shape(
    {
      ...curve,
      warp(curvature, thickness) {
        regime = regimeOnCurve(curve, disc, curvature, thickness);
        return curve.warp(curvature, thickness);
      },
    },
    "warp",
  );
  return thicknesses.map((thickness) => {
    inputs[place] = thickness;
    model.evaluate(inputs, 1, warp);
    return { thickness, warp: warp[0] ?? 0, linearWarp: linearWarp(thickness), regime };
  });
}

/** One curve for each kind of silicon and size of wafer: a keystroke must not build it again. */
const curves = new Map<string, ShapeCurve>();

function siliconCurve({ radius, youngsModulus, poissonsRatio, crystal }: StackDisc): ShapeCurve {
  const key = `${crystal ?? ""} ${poissonsRatio} ${radius}`;
  const known = curves.get(key);
  if (known) return known;
  const curve = shapeCurve({ radius, youngsModulus, poissonsRatio, ...(crystal && { crystal }) });
  // A handful of wafer sizes exists; whoever asks for hundreds gets no memory of ours.
  if (curves.size < 16) curves.set(key, curve);
  return curve;
}

/** The regime of a shape read from the curve. */
function regimeOnCurve(curve: ShapeCurve, disc: StackDisc, curvature: number, thickness: number): ShapeRegime {
  const onset = criticalLinearCurvature({ ...disc, thickness });
  const sagitta = Math.abs(curve.sagitta(curvature, thickness));
  const flat = Math.abs(bowFromCurvature({ curvature, radius: disc.radius }));
  return shapeRegime(Math.abs(curvature) / onset, sagitta, flat - sagitta);
}

const THINNEST = 1e-6;
/** Ratio of neighbouring thicknesses at which the load is looked at from the thick end. */
const STRIDE = 1.04;
const HALVINGS = 50;

/**
 * Thickness of silicon below which the free wafer rolls about one axis, m, between 1 µm and `upTo`; `upTo` when it rolls even
 * there, null when it does not roll in that range.
 *
 * The search comes from the thick end and stops at the first thickness that rolls: films that balance each other at one
 * thickness only can leave a flat stretch further down, and the limit above it is the one that matters.
 */
export function curlingThickness(stack: StackInput, upTo: number): number | null {
  const rolls = (thickness: number) => {
    const { disc } = freeDisc(withThickness(stack, thickness));
    return typeof disc.linearCurvature === "number"
      ? Math.abs(disc.linearCurvature) > criticalLinearCurvature(disc)
      : freeWaferShape(disc).regime === "curled";
  };
  if (rolls(upTo)) return upTo;
  let stable = upTo;
  while (stable > THINNEST) {
    const next = Math.max(THINNEST, stable / STRIDE);
    if (rolls(next)) return boundary(rolls, next, stable);
    stable = next;
  }
  return null;
}

/** Where `rolls` changes between a thickness that does and a thicker one that does not. */
function boundary(rolls: (thickness: number) => boolean, rolling: number, stable: number): number {
  let [low, high] = [rolling, stable];
  for (let halving = 0; halving < HALVINGS; halving++) {
    const middle = Math.sqrt(low * high);
    if (rolls(middle)) low = middle;
    else high = middle;
  }
  return high;
}
