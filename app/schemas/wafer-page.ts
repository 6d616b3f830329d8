import type { Expanded, FilmAnalysis } from "./film-analysis.ts";
import type { ScanParameters } from "./scan-result.ts";

/** A film on a wafer, to choose. */
export interface FilmChoice {
  key: string;
  name: string;
  /** m */
  thickness: number;
  scans: number;
}

/** One of the scans that the figures come from; SI. */
export interface ScanLine {
  id: string;
  label: string;
  /** from the notch, rad; null where nobody has said */
  azimuth: number | null;
  change: Expanded;
  stress: Expanded;
  instrument: string | null;
  createdAt: string;
  createdBy: string;
}

/** A film on a wafer with what its scans say; `fault` says why they say nothing together. */
export interface FilmOnWafer {
  key: string;
  name: string | null;
  filmId: string | null;
  parameters: ScanParameters;
  scans: ScanLine[];
  /** what a reader must know about how the scans were put together */
  remarks: string[];
  analysis: FilmAnalysis | null;
  fault: string | null;
}

export interface WaferPage {
  id: string;
  name: string;
  slot: number | null;
  lot: { id: string; name: string } | null;
  program: { name: string; slug: string };
  films: FilmChoice[];
  film: FilmOnWafer | null;
}
