import { EngineInputError } from "../errors.ts";
import { requireThickness, requireWithin } from "../inputs.ts";

export interface ThicknessContribution {
  /** What it comes from: 'carrier', 'adhesive', 'grinding'. */
  name: string;
  /** Total thickness variation that it adds, highest less lowest, m. */
  variation: number;
}

export interface ThicknessBudgetInput {
  contributions: readonly ThicknessContribution[];
  /** Silicon left after thinning, m. */
  finalThickness: number;
  /** How far vias stand out after the reveal, m. Without vias leave it out. */
  viaProtrusion?: number;
}

export interface ThicknessBudget {
  /** All contributions at their worst together, m. */
  linear: number;
  /** Independent contributions, root of the sum of squares, m. */
  rootSumSquare: number;
  /** Smaller of a tenth of the final thickness and the protrusion, m. */
  allowed: number;
  /** Which of the two that is. */
  governedBy: "final thickness" | "via protrusion";
  /** Share of what is allowed, 1 at the limit. */
  linearShare: number;
  rootSumSquareShare: number;
  /** Each contribution's share of the sum of squares, in the order given; they add up to 1. */
  shares: { name: string; share: number }[];
}

/** The variation may take one part in so many of the final thickness. Common practice, no source. */
const PARTS_OF_FINAL_THICKNESS = 10;

/**
 * Thickness variation of a thinned wafer against what it may be: the bonded wafer is ground parallel to the carrier's back, so
 * the variations of carrier, adhesive and grinding end up in the silicon.
 *
 * Linear is the worst case; the root of the sum of squares is the usual one for independent contributions. Allowed is the
 * smaller of 10 % of the final thickness and, where vias are revealed, their protrusion. A contribution of zero is legal.
 * Bad input throws `EngineInputError`. Source: arithmetic; the limits are common practice, no source.
 */
export function thicknessBudget(i: ThicknessBudgetInput): ThicknessBudget {
  if (i.contributions.length === 0) throw new EngineInputError("contributions", "are missing", "at least one");
  const parts = i.contributions.map(({ name, variation }, n) => ({
    name,
    variation: requireWithin(`contributions[${n}].variation`, variation, 0, 1e-2, "m"),
  }));
  const ofThickness = requireThickness("finalThickness", i.finalThickness) / PARTS_OF_FINAL_THICKNESS;
  const protrusion =
    i.viaProtrusion === undefined ? Infinity : requireWithin("viaProtrusion", i.viaProtrusion, 1e-9, 1e-2, "m");
  const allowed = Math.min(ofThickness, protrusion);
  const linear = parts.reduce((sum, { variation }) => sum + variation, 0);
  const squares = parts.reduce((sum, { variation }) => sum + variation ** 2, 0);
  const rootSumSquare = Math.sqrt(squares);
  return {
    linear,
    rootSumSquare,
    allowed,
    governedBy: protrusion < ofThickness ? "via protrusion" : "final thickness",
    linearShare: linear / allowed,
    rootSumSquareShare: rootSumSquare / allowed,
    shares: parts.map(({ name, variation }) => ({ name, share: squares === 0 ? 0 : variation ** 2 / squares })),
  };
}
