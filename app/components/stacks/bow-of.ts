import type { BowShape } from "#app/components/drawings/bow-shape.ts";
import { chooseExaggeration } from "#app/components/drawings/choose-exaggeration.ts";
import type { EstimateAnswer } from "#app/schemas/estimate.ts";

type Shape = EstimateAnswer["shape"];

/** The shape of a free wafer as a bow line draws it, device side up. */
export function bowOf({ regime, bow_m, roll_radius_m }: Shape): BowShape {
  if (regime === "curled" && roll_radius_m !== null)
    return { kind: "rolled", radius: roll_radius_m, edgesUp: bow_m < 0 };
  return { kind: "bowed", bow: bow_m };
}

/** One exaggeration for wafers of several diameters: rolled ones are drawn at ×1 and do not count. */
export function exaggerationOf(wafers: readonly { shape: Shape; diameter: number }[]): number {
  const shares = wafers.flatMap(({ shape, diameter }) => (shape.regime === "curled" ? [] : [shape.bow_m / diameter]));
  return shares.length === 0 ? 1 : chooseExaggeration(shares, 1);
}
