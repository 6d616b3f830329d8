import type { IncidentRates } from "#app/lib/incident-rates.ts";
import type { LimitEvidence } from "#app/lib/limit-evidence.ts";

/** What the page of rates shows. */
export interface IncidentRatesView {
  rates: IncidentRates;
  /** limits of thickness of which anything is known, with their title and value in words */
  limits: (LimitEvidence & { title: string; value: string })[];
  /** slug of the program that alone is counted; empty for all of the reader's */
  program: string;
  programs: { value: string; label: string }[];
}
