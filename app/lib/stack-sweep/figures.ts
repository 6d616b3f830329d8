import { standardBow } from "#app/engine/stoney/bow.ts";
import { reachedWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { freeDisc } from "#app/engine/stack/estimate-stack.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { shareOfHalfTurn } from "../comparison/half-turn.ts";

/** What a free wafer with a stack comes to, SI; by the full model, the same as its estimate. */
export interface SweptFigures {
  /** standard bow; of a curled wafer the lift of its edge, which is no bow */
  bow: number;
  warp: number;
  /** along the axis that bends most and across it, of the least-squares parabola, positive for a bowl */
  along: number;
  across: number;
  /** largest size of stress in a film, whichever way, by small-deflection theory; null without films */
  filmStress: number | null;
  /** load over the load at which it begins to roll: beyond 1 it is curled */
  load: number;
  /** from 1 on it is rolled past half a turn, where its warp means nothing */
  turn: number;
  /**
   * which way it bends: with it a figure without a sign passes through zero in a straight line, not in a cusp. Always 1 where
   * directions differ: from one axis to the other the bend turns over without being flat.
   */
  side: 1 | -1;
}

/**
 * Figures of a stack.
 * @throws EngineInputError naming the input
 */
export function sweptFigures(stack: StackInput): SweptFigures {
  const { laminate, unequal, disc } = freeDisc(stack);
  const shape = reachedWaferShape(disc);
  // Layers count from below, so the silicon lies on the films of its back.
  const silicon = stack.films.filter(({ side }) => side === "back").length;
  const stresses = [laminate.stressBottom, laminate.stressTop].flatMap((faces) =>
    faces.filter((_, layer) => layer !== silicon).map(Math.abs),
  );
  return {
    bow: standardBow(shape.bowMajor),
    warp: shape.warp,
    along: shape.parabolaCurvatureMajor,
    across: shape.parabolaCurvatureMinor,
    filmStress: stresses.length > 0 ? Math.max(...stresses) : null,
    load: shape.stabilityRatio,
    turn: shareOfHalfTurn(shape, stack.wafer.diameter),
    side: unequal === null && shape.bowMajor < 0 ? -1 : 1,
  };
}
