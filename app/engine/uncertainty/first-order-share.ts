import { requireFinite } from "../inputs.ts";
import type { FirstOrderUncertainty } from "./first-order.ts";
import { normalShareBelow } from "./random/inverse-normal.ts";
import { rootSumOfSquares } from "./random/elementary.ts";

/** Share of a lot's wafers beyond a limit by first order. */
export interface FirstOrderShare {
  /** best estimate: mean over what is not known of the common part */
  share: number;
  /** share with the common part two standard uncertainties down and up, about 95 % */
  interval: [number, number];
}

/**
 * Share of wafers beyond `limit` when the figure is straight and its spread normal: the common part moves all wafers together,
 * what differs between them spreads them. With nothing that differs, a lot lies beyond the limit as a whole or not at all.
 * As good as the assumption: see `linear` of the first order; `lotShare` samples the same without it. Own derivation.
 */
export function firstOrderShare(
  { value, common, betweenWafers }: FirstOrderUncertainty,
  limit: number,
): FirstOrderShare {
  const beyond = requireFinite("limit", limit);
  const [moved, spread] = [common.standardUncertainty, betweenWafers.standardUncertainty];
  const share = (figure: number, u: number) =>
    u > 0 ? normalShareBelow((figure - beyond) / u) : figure > beyond ? 1 : 0;
  return {
    share: share(value, rootSumOfSquares([moved, spread])),
    interval: [share(value - 2 * moved, spread), share(value + 2 * moved, spread)],
  };
}
