import type { IncidentRates } from "#app/lib/incident-rates.ts";

/** What the page of rates shows. */
export interface IncidentRatesView {
  rates: IncidentRates;
  /** slug of the program that alone is counted; empty for all of the reader's */
  program: string;
  programs: { value: string; label: string }[];
}
