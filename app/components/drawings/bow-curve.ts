import { coordinate } from "./coordinate.ts";

/**
 * The drawn middle line of a wafer's section, symmetrical about x = 0, y down, in px. `centreY` is the height of the
 * wafer's centre. A parabola's `rise` is how far its rim lies below its centre; an arc keeps its length.
 */
export type BowCurve =
  | { kind: "parabola"; centreY: number; half: number; rise: number }
  | { kind: "arc"; centreY: number; radius: number; halfAngle: number; edgesUp: boolean };

/** A curve beside the middle line, as path text with its two ends. */
export interface CurvePath {
  start: readonly [x: number, y: number];
  end: readonly [x: number, y: number];
  /** Drawing commands from start to end, without the opening move. */
  command: string;
}

/**
 * The curve `offset` px above the middle line (negative: below), left to right, or right to left when `reverse`.
 * Parabolas become one cubic that is exact at offset 0; arcs stay arcs.
 */
export function offsetCurve(curve: BowCurve, offset: number, reverse = false): CurvePath {
  return curve.kind === "arc" ? offsetArc(curve, offset, reverse) : offsetParabola(curve, offset, reverse);
}

function offsetParabola(curve: BowCurve & { kind: "parabola" }, offset: number, reverse: boolean): CurvePath {
  const slope = (2 * curve.rise) / curve.half;
  const length = Math.hypot(1, slope);
  const x = curve.half + (offset * slope) / length;
  const y = curve.centreY + curve.rise - offset / length;
  const toLeft = reverse ? -1 : 1;
  const start = [-x * toLeft, y] as const;
  const end = [x * toLeft, y] as const;
  if (Math.abs(curve.rise) < 0.01) return { start, end, command: `L${point(end)}` };
  // Tangents at both ends, and their length such that the cubic passes the centre at the right distance.
  const reach = (curve.rise + offset - offset / length) / (0.75 * slope);
  const first = [start[0] + reach * toLeft, y - reach * slope] as const;
  const second = [end[0] - reach * toLeft, y - reach * slope] as const;
  return { start, end, command: `C${point(first)} ${point(second)} ${point(end)}` };
}

function offsetArc(curve: BowCurve & { kind: "arc" }, offset: number, reverse: boolean): CurvePath {
  const up = curve.edgesUp ? 1 : -1;
  const radius = Math.max(0.5, curve.radius - up * offset);
  const middleY = curve.centreY - up * curve.radius;
  const x = radius * Math.sin(curve.halfAngle);
  const y = middleY + up * radius * Math.cos(curve.halfAngle);
  const start = [reverse ? x : -x, y] as const;
  const end = [reverse ? -x : x, y] as const;
  const large = curve.halfAngle > Math.PI / 2 ? 1 : 0;
  const sweep = curve.edgesUp === reverse ? 1 : 0;
  const size = coordinate(radius);
  return { start, end, command: `A${size} ${size} 0 ${large} ${sweep} ${point(end)}` };
}

function point([x, y]: readonly [number, number]): string {
  return `${coordinate(x)} ${coordinate(y)}`;
}

/** One open line. */
export function linePath(curve: BowCurve, offset = 0): string {
  const line = offsetCurve(curve, offset);
  return `M${point(line.start)}${line.command}`;
}

/** A closed band between two offsets. */
export function bandPath(curve: BowCurve, upper: number, lower: number): string {
  const top = offsetCurve(curve, upper);
  const bottom = offsetCurve(curve, lower, true);
  return `M${point(top.start)}${top.command}L${point(bottom.start)}${bottom.command}Z`;
}
