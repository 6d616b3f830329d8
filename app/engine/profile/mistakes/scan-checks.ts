import type { AzimuthReading } from "../azimuths.ts";
import type { ScanColumns } from "../columns.ts";

/** A value with its standard uncertainty, SI. */
export interface Estimate {
  value: number;
  standardUncertainty: number;
}

/** A day of the calendar as a file or a form has it. */
export interface CalendarDay {
  year: number;
  /** 1 to 12 */
  month: number;
  /** 1 to 31 */
  day: number;
}

/** One scan and what its record says. */
export interface CheckedScan extends ScanColumns {
  /** angle of the line from the notch as recorded, rad */
  azimuth?: number | null;
  /** when it was taken, seconds of any one clock */
  at?: number | null;
  /** how many azimuths the tool averaged into it, when known */
  azimuthsAveraged?: number | null;
}

/**
 * All that the checks for mistakes may look at; everything is optional, and what is missing makes a check say 'cannot tell'.
 * Scans device side up as their records say, x from the wafer's centre, m.
 */
export interface ScanChecks {
  pre?: CheckedScan | null;
  post?: CheckedScan | null;
  /** left out at either end, m; default 3 mm */
  edgeExclusion?: number;
  /** change of curvature, post less pre, as measured, 1/m */
  change?: Estimate | null;
  /** the same as predicted or as earlier accepted values give it */
  expectedChange?: Estimate | null;
  /** curvature of the scan before the film, 1/m, when it was measured */
  before?: Estimate | null;
  wafer?: {
    /** nominal diameter, m */
    diameter: number;
    /** thickness that the calculation uses, m */
    thickness: number;
    /** where it comes from */
    thicknessFrom?: "measured" | "nominal" | null;
    /** thickness measured on this wafer, m */
    measured?: Estimate | null;
  } | null;
  /** biaxial modulus that the tool's or the sheet's stress was reduced with, Pa */
  biaxialModulus?: number | null;
  /** of the wafer as it is, Pa */
  expectedModulus?: number | null;
  /** stress as the tool reduced it, and as recomputed here from its radii, Pa */
  reduced?: { byTool: number; recomputed: number } | null;
  film?: {
    /** m */
    thickness: number;
    /** as the film's record or recipe has it, m */
    expectedThickness?: number | null;
    /** where the value is to be used: the film's thickness there, m */
    usedAt?: number | null;
    /** cures after deposition: time of the end of cure, on the scans' clock, s */
    curedAt?: number | null;
    /** whether it cures at all */
    cures?: boolean | null;
  } | null;
  /** curvatures of the change along several azimuths */
  azimuths?: readonly AzimuthReading[] | null;
  /** the day as read from the file, and between which days it must lie */
  date?: { read: CalendarDay; earliest: CalendarDay | null; latest: CalendarDay | null } | null;
  /** one figure per slot in the order of the file, with what each slot was expected to have */
  slots?: readonly { measured: number; expected: number }[] | null;
}

/** Coverage factor beyond which two figures count as different, and within which as alike. */
export const APART = 3;
export const ALIKE = 2;

/** How far a figure lies from what one hypothesis says of it, in standard uncertainties of the difference. */
export function distance(measured: Estimate, hypothesis: Estimate): number {
  const together = Math.hypot(measured.standardUncertainty, hypothesis.standardUncertainty);
  const off = Math.abs(measured.value - hypothesis.value);
  return together > 0 ? off / together : off === 0 ? 0 : Number.MAX_VALUE;
}

/** An estimate times a number. */
export function scaledEstimate({ value, standardUncertainty }: Estimate, by: number): Estimate {
  return { value: by * value, standardUncertainty: Math.abs(by) * standardUncertainty };
}
