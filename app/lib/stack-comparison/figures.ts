import { atItsTemperature, freeDisc, pullOf } from "#app/engine/stack/estimate-stack.ts";
import { withThickness, type StackInput } from "#app/engine/stack/model.ts";
import { bowUncertainty } from "#app/engine/stack/warp-uncertainty.ts";
import { reachedWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import type { ShapeRegime } from "#app/engine/vocabulary.ts";
import type { ComparedInputs } from "#app/schemas/stack-comparison.ts";
import type { LetteredCurve } from "../comparison/crossing-words.ts";
import { remembered } from "../comparison/crossings.ts";
import { shareOfHalfTurn } from "../comparison/half-turn.ts";
import { stackOf } from "../stack-of-request.ts";
import type { Estimated } from "../stack-words.ts";

/** A stack that is compared, with the letter that stands for it. */
export interface ComparedStack extends ComparedInputs {
  letter: string;
  /** null where the engine cannot take it */
  figures: StackFigures | null;
}

/** The free wafer at another thickness, m. */
export interface WarpAt {
  thickness: number;
  warp: number;
  regime: ShapeRegime;
  /** the roll is more than half a turn across, where the warp means nothing any more */
  rolledUp: boolean;
}

export interface StackFigures {
  /** with its curve */
  estimated: Estimated;
  stack: StackInput;
  /** of the bow, m; null without a tolerance, or where it is not close to linear over them */
  bowUncertainty: number | null;
  /** at its own thickness */
  own: WarpAt;
  warpAt: WarpAt[];
  /** force per width of each film, N/m, tension positive; of lines the mean of along and across */
  pulls: number[];
}

/** Remaining thicknesses that stacks are compared at besides their own, m. */
export const COMPARED_AT = [775e-6, 200e-6, 100e-6, 50e-6, 20e-6] as const;

/** Figures of an estimated stack that its estimate does not have. */
export function stackFigures(estimated: Estimated): StackFigures {
  const stack = stackOf(estimated.request);
  const bow = bowUncertainty(stack);
  return {
    estimated,
    stack,
    bowUncertainty: bow?.linear ? bow.standardUncertainty : null,
    own: warpAt(stack, stack.wafer.thickness),
    warpAt: COMPARED_AT.map((thickness) => warpAt(stack, thickness)),
    pulls: atItsTemperature(stack).films.map((film) => {
      const { x, y } = pullOf(film);
      return (x + y) / 2;
    }),
  };
}

/** Warp of the free wafer at another thickness of its silicon (m), by the full model. */
export function warpAt(stack: StackInput, thickness: number): WarpAt {
  const shape = reachedWaferShape(freeDisc(withThickness(stack, thickness)).disc);
  const { warp, regime } = shape;
  return { thickness, warp, regime, rolledUp: shareOfHalfTurn(shape, stack.wafer.diameter) >= 1 };
}

/** The warp of each stack that can be estimated as a function of its silicon thickness. */
export function stackCurves(stacks: readonly ComparedStack[]): LetteredCurve[] {
  return stacks.flatMap(({ letter, figures }) =>
    figures ? [{ letter, curve: remembered((thickness) => warpAt(figures.stack, thickness)) }] : [],
  );
}
