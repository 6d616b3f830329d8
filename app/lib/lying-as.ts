import type { BowShape } from "#app/components/drawings/bow-shape.ts";
import type { ShapeResult } from "#app/schemas/assessment-result.ts";

/** A wafer that has rolled up has a radius and an edge lift, never a bow. */
export function isRolled(shape: ShapeResult): shape is ShapeResult & { rollRadius: number } {
  return shape.regime === "curled" && shape.rollRadius !== null;
}

/** How a wafer lies on the tool, as the bow line draws it; null is a wafer that tape or frame holds flat. */
export function lyingAs(shape: ShapeResult | null): BowShape {
  if (!shape) return { kind: "held" };
  if (isRolled(shape)) return { kind: "rolled", radius: shape.rollRadius, edgesUp: shape.edgesUp };
  // Drawn as it lies: with its edges up the centre is low, whichever side is up.
  return { kind: "bowed", bow: shape.edgesUp ? -Math.abs(shape.bow) : Math.abs(shape.bow) };
}
