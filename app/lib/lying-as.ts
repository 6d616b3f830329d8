import type { BowShape } from "#app/components/drawings/bow-shape.ts";
import type { ShapeResult } from "#app/schemas/assessment-result.ts";

/** How a wafer lies on the tool, as the bow line draws it; null is a wafer that tape or frame holds flat. */
export function lyingAs(shape: ShapeResult | null): BowShape {
  if (!shape) return { kind: "held" };
  if (shape.regime === "curled" && shape.rollRadius !== null)
    return { kind: "rolled", radius: shape.rollRadius, edgesUp: shape.edgesUp };
  // With its edges up the centre is low as drawn, whichever side is up.
  return { kind: "bowed", bow: shape.edgesUp ? -Math.abs(shape.bow) : Math.abs(shape.bow) };
}
