/** The words of the product, one meaning each. Screens, sheets, rules and stored results all use these and no others. */

/** What a step needs to hold the wafer, weakest first. `none fits` means that no support makes the step possible. */
export const SUPPORT_CLASSES = ["bare", "thin-wafer gripper", "tape or ring", "carrier", "none fits"] as const;
export type SupportClass = (typeof SUPPORT_CLASSES)[number];

/** What is planned to hold the wafer at a step. */
export const HOLDINGS = ["bare", "thin-wafer gripper", "grinding tape", "film frame", "edge ring", "carrier"] as const;
export type Holding = (typeof HOLDINGS)[number];

/** The support class that a planned holding gives. */
export function supportClassOf(holding: Holding): SupportClass {
  switch (holding) {
    case "bare":
    case "thin-wafer gripper":
    case "carrier":
      return holding;
    case "grinding tape":
    case "film frame":
    case "edge ring":
      return "tape or ring";
  }
}

/** Rank of a support class: a planned class meets a required one when its rank is at least as high. */
export function supportRank(support: SupportClass): number {
  return SUPPORT_CLASSES.indexOf(support);
}

/** Outcome of one rule at one step, mildest first; `cannot judge` blocks release like `do not run`. */
export const OUTCOMES = ["clear", "caution", "needs support", "cannot judge", "do not run"] as const;
export type Outcome = (typeof OUTCOMES)[number];

/** Rank of an outcome: the verdict of an assessment is its highest-ranked finding. */
export function outcomeRank(outcome: Outcome): number {
  return OUTCOMES.indexOf(outcome);
}

/** Where a value comes from; `assumed` stays visible all the way to the sheet. */
export const SOURCE_KINDS = ["measured here", "supplier", "handbook", "assumed"] as const;
export type SourceKind = (typeof SOURCE_KINDS)[number];

/** How the wafer lies on the tool. The words are as loaded, not device side up. */
export const SHAPE_WORDS = ["flat", "edges up", "edges down", "saddle", "rolls up", "held"] as const;
export type ShapeWord = (typeof SHAPE_WORDS)[number];

/** Said in place of a direction where the warp is smaller than the ± beside it: which edges lie up is then not known. */
export const FLAT_WITHIN_UNCERTAINTY = "flat within its uncertainty";

/**
 * Whether a warp (m) is smaller than its expanded uncertainty, k = 2, the ± that stands beside it; never where that is unknown.
 * A warp has no sign, so an uncertainty of the warp itself shrinks with it near zero, but never below it.
 */
export function flatWithinUncertainty(warp: number, standardUncertainty: number | null): boolean {
  return standardUncertainty !== null && warp < 2 * standardUncertainty;
}

/** The word for how it lies, or that its uncertainty does not tell. */
export function knownShapeWord(word: ShapeWord, warp: number, standardUncertainty: number | null): string {
  const bent = word === "edges up" || word === "edges down" || word === "saddle";
  return bent && flatWithinUncertainty(warp, standardUncertainty) ? FLAT_WITHIN_UNCERTAINTY : word;
}

/** Which face is up on the tool: from bond to debond usually the one away from the carrier that the wafer lies on. */
export const FACES_UP = ["device side", "back side"] as const;
export type FaceUp = (typeof FACES_UP)[number];

/** Regime of a free wafer's shape: small bow, bow beyond the linear range, rolled about one axis. */
export type ShapeRegime = "linear" | "nonlinear" | "curled";

/** Which side of the silicon a film is on. `front` is the device side. */
export type Side = "front" | "back";

/** What a side is called. */
export const SIDE_NAMES = { front: "device side", back: "back side" } as const satisfies Record<Side, FaceUp>;

export const otherSide = (side: Side): Side => (side === "front" ? "back" : "front");

/** Conditions that a step exposes the wafer, its bond and its tape to. */
export const EXPOSURES = [
  "vacuum",
  "plasma",
  "solvent",
  "acid",
  "base",
  "water",
  "flux",
  "nitrogen",
  "ultraviolet light",
] as const;
export type Exposure = (typeof EXPOSURES)[number];
