import type { ReachedWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { HALF_TURN } from "../stack-chart.ts";

/** A roll that has closed is lower than one of half a turn: from this share of that one's radius on it tells by its radius. */
const CLOSING = 0.75;

/** How far a free wafer of a diameter (m) is rolled: from 1 on past half a turn across, where its warp means nothing any more. */
export function shareOfHalfTurn(
  { warp, rollRadius }: Pick<ReachedWaferShape, "warp" | "rollRadius">,
  diameter: number,
): number {
  const halfTurn = (HALF_TURN * diameter) / 2;
  return Math.max(warp / halfTurn, rollRadius === null ? 0 : (CLOSING * halfTurn) / rollRadius);
}
