import type { BowCurve } from "./bow-curve.ts";

/**
 * A wafer's shape as it lies on the tool, not device side up. `bow` is positive when the centre is high as drawn, m;
 * `radius` is the roll radius, m. `held` is a wafer that its tape, ring or chuck keeps flat.
 */
export type BowShape =
  | { kind: "bowed"; bow: number }
  | { kind: "rolled"; radius: number; edgesUp: boolean }
  | { kind: "saddle"; bowX: number; bowY: number }
  | { kind: "flat" }
  | { kind: "held" };

/** Beyond this half angle a rolled wafer's edges would meet: the drawing stops just short of it. */
const WIDEST_HALF_ANGLE = 0.96 * Math.PI;

export interface BowBox {
  /** Room for the wafer's line from rim to rim when flat, px. */
  width: number;
  /** Greatest height of the bent line, px; line widths may overhang it. */
  height: number;
  /** Middle of the bent line, px. */
  middleY: number;
}

export interface DrawnBow {
  /** The section along x, drawn solid. */
  curve: BowCurve;
  /** The section along y of a saddle, drawn dashed on the same datum. */
  across: BowCurve | null;
  /** Height of the datum: through the rim, of a saddle through the centre. */
  datumY: number;
}

/**
 * Geometry of a bow line. A bow is a parabola, E = (drawn height/drawn width)/(true height/true width); a rolled wafer is
 * a true arc at ×1 that keeps its length. When the line would be higher than its box, both directions shrink alike, so
 * that E stays what it says.
 * @param shape as it lies
 * @param diameter wafer diameter, m
 * @param exaggeration the page's, from chooseExaggeration
 */
export function drawBow(shape: BowShape, diameter: number, exaggeration: number, box: BowBox): DrawnBow {
  const scale = box.width / diameter;
  switch (shape.kind) {
    case "flat":
    case "held":
      return parabolas(box, box.width / 2, [0]);
    case "bowed":
      return parabolas(box, box.width / 2, [shape.bow * exaggeration * scale]);
    case "saddle":
      return parabolas(box, box.width / 2, [shape.bowX * exaggeration * scale, shape.bowY * exaggeration * scale]);
    case "rolled": {
      const halfAngle = Math.min(diameter / 2 / shape.radius, WIDEST_HALF_ANGLE);
      const drop = shape.radius * scale * (1 - Math.cos(halfAngle));
      const fit = Math.min(1, box.height / drop);
      const height = drop * fit;
      const centreY = box.middleY + (shape.edgesUp ? height / 2 : -height / 2);
      return {
        curve: { kind: "arc", centreY, radius: shape.radius * scale * fit, halfAngle, edgesUp: shape.edgesUp },
        across: null,
        datumY: shape.edgesUp ? centreY - height : centreY + height,
      };
    }
  }
}

function parabolas(box: BowBox, half: number, rises: readonly number[]): DrawnBow {
  const lowest = Math.max(0, ...rises);
  const highest = Math.min(0, ...rises);
  const fit = Math.min(1, box.height / Math.max(lowest - highest, 1e-9));
  const centreY = box.middleY - ((lowest + highest) / 2) * fit;
  const [rise = 0, riseAcross] = rises.map((each) => each * fit);
  const at = (value: number): BowCurve => ({ kind: "parabola", centreY, half: half * fit, rise: value });
  return {
    curve: at(rise),
    across: riseAcross === undefined ? null : at(riseAcross),
    datumY: riseAcross === undefined ? centreY + rise : centreY,
  };
}
