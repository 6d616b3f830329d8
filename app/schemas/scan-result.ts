import type { DecimalMark, LengthUnit } from "#app/lib/scan-reading/reading.ts";

/** Units and decimal mark of a file of one profile. */
export interface FileFormat {
  positionUnit: LengthUnit;
  heightUnit: LengthUnit;
  decimalMark: DecimalMark;
}

/** What a scan was computed with, SI where it is a quantity; the format is that of the file before the film. */
export interface ScanParameters extends FileFormat {
  orientation: "100" | "111";
  filmThickness: number;
  filmThicknessTolerance: number | null;
  siliconThickness: number;
  siliconThicknessTolerance: number | null;
  /** null where nobody has said, missing from before it was asked */
  siliconThicknessFrom?: "measured" | "nominal" | null;
  /** from the end of the film's cure to the scan after it, s; likewise */
  sinceCure?: number | null;
  diameter: number;
  edgeExclusion: number;
}

/** A row of a file that could not be used: counted from 1 as an editor shows it, with what stood there. */
export interface SkippedRow {
  row: number;
  column: "position" | "height";
  text: string;
}

/** How one file was read. */
export interface FileReading {
  /** rows of data, used or not */
  rows: number;
  used: number;
  /** columns that a row has */
  columns: number;
  /** places of position and height among them, from 0; the first two where a stored reading does not say */
  readColumns?: [position: number, height: number];
  heading: string | null;
  delimiter: string;
  /** least and greatest position, m */
  from: number;
  to: number;
  skipped: SkippedRow[];
  skippedInAll: number;
  /** points that the fit was given in place of those used, each the mean of a stretch; left out when it was given all */
  averagedTo?: number;
  /** of this file; left out in older readings, where both files had that of the scan */
  format?: FileFormat;
}

/** Share of one input in the uncertainty of the stress. `given` is false where nobody stated a tolerance. */
export interface ScanContribution {
  input: string;
  /** standard uncertainty that it gives the stress, Pa */
  contribution: number;
  given: boolean;
}

/** What came out, SI; every uncertainty is a standard one. `bowChange` is the standard bow over the wafer's diameter. */
export interface ScanResult {
  biaxialModulus: number;
  curvatureBefore: number;
  curvatureAfter: number;
  curvatureChange: number;
  curvatureUncertainty: number;
  bowChange: number;
  bowUncertainty: number;
  /** after the film, when it can be no bowl any more: then there is no bow */
  curled: { rollRadius: number; edgeLift: number } | null;
  /** share by which the small-deflection relation understates the stress; null when curled */
  understatedBy: number | null;
  stress: number;
  stressUncertainty: number;
  budget: ScanContribution[];
  /** left over after the fit, root mean square, m */
  rms: number;
  quartic: number;
  steep: boolean;
  /** stretch that both scans cover, m as in the files */
  from: number;
  to: number;
  used: number;
  /** points off the parabola that the fit left out, and the positions of the first of them, m from the middle of the scan */
  rejected: number;
  rejectedAt: number[];
  before: FileReading;
  after: FileReading;
  /**
   * thinned for drawing: position from the middle of the scan, heights after each scan was levelled, the parabola through the
   * difference, m
   */
  curve: { x: number; before: number; after: number; difference: number; fitted: number }[];
}
