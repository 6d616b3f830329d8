import type { SourceKind } from "#app/engine/vocabulary.ts";
import type { ShownWorking } from "#app/lib/shown-working.ts";
import type { FilmAnalysis } from "./film-analysis.ts";
import type { ScanParameters, ScanResult } from "./scan-result.ts";

/** A scan as a list shows it; SI, standard uncertainties. */
export interface ScanRow {
  id: string;
  label: string;
  program: string;
  film: string | null;
  diameter: number;
  stress: number;
  stressUncertainty: number;
  /** standard bow, m */
  bowChange: number;
  bowUncertainty: number;
  /** the wafer has rolled: there is neither a bow nor a stress to show */
  curled: boolean;
  createdAt: string;
  createdBy: string;
}

/** The film of the library that a scan is compared with, at its stress of today. */
export interface ScanFilm {
  id: string;
  name: string;
  stress: number;
  stressTolerance: number | null;
  source: SourceKind;
}

/** A kept file; its name is that under which the same bytes first came. */
export interface ScanFileView {
  id: string;
  name: string;
  /** bytes */
  size: number;
  /** SHA-256, hex */
  hash: string;
}

/** Whether the person may undo the import of a scan; `use` says by what it is used, which forbids it. */
export interface ScanUndo {
  may: boolean;
  use: string | null;
}

/** One scan, as its page shows it. */
export interface ScanDetail {
  id: string;
  label: string;
  program: { id: string; name: string; slug: string };
  film: ScanFilm | null;
  files: Record<"before" | "after", ScanFileView>;
  /** null for a pair that was uploaded without a wafer of its own */
  placed: { wafer: { id: string; label: string }; azimuth: number | null; instrument: string } | null;
  /** what an undo would meet */
  undo: ScanUndo;
  parameters: ScanParameters;
  result: ScanResult;
  working: ShownWorking;
  /** what its points and all that is known beside them say; null where they give no answer */
  analysis: FilmAnalysis | null;
  engineVersion: string;
  createdAt: string;
  createdBy: string;
}
