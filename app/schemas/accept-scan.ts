import type { Measured } from "#app/engine/measured.ts";
import type { FilmStressState, StressMean } from "./film-stress.ts";

/** Where a scan stands in its film's history. */
export interface AcceptedAs {
  film: { id: string; name: string };
  /** null: nobody has accepted it; its film may be another one by now */
  value: { state: FilmStressState; film: { id: string; name: string }; at: string; by: string } | null;
  mayAccept: boolean;
}

/** What accepting a scan would do. */
export interface Acceptance {
  scan: { id: string; label: string; program: string };
  /** ISO day, to begin with */
  measuredOn: string;
  /** as the scan has it, to begin with; empty when nobody named one */
  instrument: string;
  /** null for a scan of no film */
  film: { id: string; name: string; version: number; stress: Measured; usesMean: boolean } | null;
  /** why it cannot be accepted; null when it can */
  refused: string | null;
  offer: {
    stress: { value: number; standardUncertainty: number; remark: string | null };
    /** of the values that count, with this one */
    mean: StressMean;
    /** as they are named in the history */
    instruments: string[];
  } | null;
  /** flows of the person's own programs that use the film */
  flows: number;
}
