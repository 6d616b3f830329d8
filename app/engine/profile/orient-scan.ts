import { EngineInputError } from "../errors.ts";
import { requireFinite } from "../inputs.ts";
import { ascendingColumns, type ScanColumns } from "./columns.ts";

/** How a scan lay on the tool. */
export interface ScanLie {
  /** which side looked up */
  up: "device side" | "back side";
  /** edge over which the wafer was turned when its back side is up: the scan's own line, or the line across it */
  turnedOver?: "along the scan" | "across the scan";
}

/** A direction on the wafer, rad, taken into 0 to π: a line and the same line run the other way are one. */
export function lineAzimuth(azimuth: number): number {
  const turn = requireFinite("azimuth", azimuth) % Math.PI;
  const line = turn < 0 ? turn + Math.PI : turn;
  return line >= Math.PI ? 0 : line;
}

/** Smallest angle between two lines on the wafer, rad, 0 to π/2. */
export function angleBetween(a: number, b: number): number {
  const apart = Math.abs(lineAzimuth(a) - lineAzimuth(b));
  return Math.min(apart, Math.PI - apart);
}

/**
 * A scan as if it had been taken device side up, x along its line's azimuth between 0 and π.
 *
 * Azimuth: angle of the scan's x axis from the direction centre to notch, counter-clockwise seen on the device side, rad. x is
 * zero at the wafer's centre. With the back side up z changes its sign, and x too when the wafer was turned over the line across
 * the scan. The thickness between the two faces is taken as even. A scan run the other way (azimuth π more) has x reversed.
 * @throws EngineInputError for an unknown side
 */
export function faceUpScan(scan: ScanColumns & { azimuth: number }, lie: ScanLie): ScanColumns & { azimuth: number } {
  if (lie.up !== "device side" && lie.up !== "back side")
    throw new EngineInputError("up", "is no side of a wafer", "device side or back side");
  const down = lie.up === "back side";
  const line = lineAzimuth(scan.azimuth);
  const turns = Math.round((scan.azimuth - line) / Math.PI);
  const reversed = (turns % 2 !== 0) !== (down && lie.turnedOver === "across the scan");
  if (!down && !reversed) return { x: scan.x, z: scan.z, azimuth: line };
  const { x, z } = ascendingColumns("scan", scan);
  return { x: x.map((at) => (reversed ? -at : at)), z: z.map((at) => (down ? -at : at)), azimuth: line };
}

/** What pairs a scan before a film with one after it. */
export interface ScanPlace {
  /** lot, slot and wafer as one name */
  wafer: string;
  /** rad */
  azimuth: number;
}

export interface PairedScans<T> {
  pairs: { pre: T; post: T }[];
  /** scans that wait for a partner */
  waiting: { pre: T[]; post: T[] };
}

/** Lines within this angle are one: 2 degrees. Common practice, no source. */
const SAME_LINE = (2 * Math.PI) / 180;

/**
 * Pairs scans of the same wafer and the same line, in the order given; a line run the other way is the same. Of several that fit
 * the nearest in azimuth is taken. What finds no partner waits.
 */
export function pairScans<T extends ScanPlace>(
  pre: readonly T[],
  post: readonly T[],
  within = SAME_LINE,
): PairedScans<T> {
  const left = [...post];
  const result: PairedScans<T> = { pairs: [], waiting: { pre: [], post: left } };
  for (const before of pre) {
    let [best, apart] = [-1, within];
    left.forEach((after, n) => {
      const angle = angleBetween(before.azimuth, after.azimuth);
      if (after.wafer !== before.wafer || angle > apart || (best >= 0 && angle === apart)) return;
      [best, apart] = [n, angle];
    });
    const [after] = best >= 0 ? left.splice(best, 1) : [];
    if (after) result.pairs.push({ pre: before, post: after });
    else result.waiting.pre.push(before);
  }
  return result;
}
