import { ascendingColumns } from "#app/engine/profile/columns.ts";
import type { ScanColumns } from "#app/engine/profile/columns.ts";
import type { Estimate, CalendarDay } from "#app/engine/profile/mistakes/scan-checks.ts";
import type { StatedUncertainty, ToolUncertainty } from "#app/engine/profile/stress/stress-budget.ts";
import type { SiteColumns } from "#app/engine/profile/map/fit-surface.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmKind } from "#app/engine/flow/model.ts";
import type { ScanParameters, ScanResult } from "#app/schemas/scan-result.ts";

/** The points of one scan, m, x from the wafer's centre along its azimuth, with the day of its file. */
export interface PlacedPoints extends ScanColumns {
  day: CalendarDay | null;
}

/** A scan before a film and one after it on one line of a wafer. */
export interface PlacedPair {
  id: string;
  label: string;
  /** of the line from the notch, rad, 0 to π; null where nobody has said */
  azimuth: number | null;
  /** null where the points are not at hand any more in reasonable time */
  points: { pre: PlacedPoints; post: PlacedPoints } | null;
  result: ScanResult;
  /** both scans come from one instrument; what is not known to be two counts as one */
  sameTool: boolean;
  tool: KnownTool | null;
}

/** What is known of the instrument of a scan. */
export interface KnownTool {
  name: string;
  /** of one scan's curvature, 1/m; null without a study */
  repeatability: StatedUncertainty | null;
  /** half of the interval to expand with k = 2 */
  forTwo: number | null;
  /** curvature by which it is off on a wafer of known bow, 1/m; null without a reading */
  offset: ToolUncertainty["offset"] | null;
}

/** The film that the scans are of. */
export interface FilmSubject {
  parameters: ScanParameters;
  film: {
    name: string;
    kind: FilmKind;
    stress: Measured;
    youngsModulus: number;
    poissonsRatio: number;
  } | null;
  /** thickness at which the program uses the film's stress, m, where it differs most from the monitor's; null when it does not */
  usedAt: number | null;
  /** silicon's thickness as measured on this wafer, m */
  measuredThickness: Estimate | null;
  thicknessSites: SiteColumns | null;
  /** the tool's own stress and the same radii reduced here, Pa */
  reduced: { byTool: number; recomputed: number } | null;
}

/** A scan whose middle lies this near to zero, as a share of the diameter, counts its positions from the centre. */
const CENTRED = 0.02;
/** Scans shorter than this share of the diameter may be radii: they are left as they are. */
const WHOLE = 0.55;

/** A scan with its positions from the middle: instruments count from the centre, or from where the stylus came down. */
export function centred(scan: ScanColumns, diameter: number): { x: Float64Array; z: Float64Array } {
  const { x, z } = ascendingColumns("scan", scan);
  const [first, last] = [x[0] ?? 0, x.at(-1) ?? 0];
  const middle = (first + last) / 2;
  if (Math.abs(middle) <= CENTRED * diameter || last - first < WHOLE * diameter) return { x, z };
  return { x: x.map((at) => at - middle), z };
}
