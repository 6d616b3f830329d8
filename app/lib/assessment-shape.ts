import { formatQuantity } from "#app/engine/units/format.ts";
import {
  FLAT_WITHIN_UNCERTAINTY,
  flatWithinUncertainty,
  knownShapeWord,
  type Holding,
  type ShapeWord,
} from "#app/engine/vocabulary.ts";
import type { ShapeResult, StepResult } from "#app/schemas/assessment-result.ts";
import { micrometres } from "./assessment-figure.ts";
import { isRolled } from "./lying-as.ts";

/** What holds it, as the end of 'held flat by': 'film frame', 'grinding tape'. */
export function heldFlat(holding: Holding): string {
  return `held flat by ${holding}`;
}

/** Its shape in words, as it lies: 'edges up 231 ± 52 µm', 'flat, 8 ± 5 µm', 'rolls up, radius about 0.32 m, edges lift 15 mm'. */
export function shapeText(shape: ShapeResult, word?: ShapeWord): string {
  if (isRolled(shape))
    return `rolls up, radius about ${radiusText(shape.rollRadius)}, edges lift ${liftText(shape.warp)}`;
  const size = micrometres(shape.warp, shape.standardUncertainty);
  if (word === "flat") return `flat, ${size}`;
  if (flatWithinUncertainty(shape.warp, shape.standardUncertainty)) return `${FLAT_WITHIN_UNCERTAINTY}, ${size}`;
  if (word === "saddle") return `saddle, ${size}`;
  return `${shape.edgesUp ? "edges up" : "edges down"} ${size}`;
}

/** The one word for how it lies, or that its uncertainty does not tell. */
export function liesWord({ lies, atRoom }: Pick<StepResult, "lies" | "atRoom">): string {
  return atRoom ? knownShapeWord(lies, atRoom.warp, atRoom.standardUncertainty) : lies;
}

/** The standard bow beside it: 'standard bow −231 ± 52 µm', with that of the other axis where they differ; null for a wafer that has rolled up, which has none. */
export function standardBowText(shape: ShapeResult): string | null {
  if (isRolled(shape)) return null;
  const across = typeof shape.bowAcross === "number" ? `, across it ${micrometres(shape.bowAcross)}` : "";
  return `standard bow ${micrometres(shape.bow, shape.standardUncertainty)}${across}`;
}

/**
 * What the wafer would do if nothing held it, with its load against the one at which it starts to roll.
 * @param released its shape at 25 °C, device side up
 */
export function releasedText(released: ShapeResult): string {
  const { stabilityRatio } = released;
  const load = formatQuantity(stabilityRatio, "number", { significant: 2, trim: true });
  if (isRolled(released)) return `${shapeText(released)}. Its load is ${load} times the one at which it starts to roll`;
  return `${shapeText(released)}, device side up. Its load is ${load} of the one at which it starts to roll`;
}

const radiusText = (radius: number) =>
  radius < 0.1
    ? formatQuantity(radius, "length", { unit: "mm", decimals: 0 })
    : formatQuantity(radius, "length", { unit: "m", significant: 2 });

const liftText = (lift: number) =>
  lift < 1e-3 ? micrometres(lift) : formatQuantity(lift, "length", { unit: "mm", significant: 2 });
