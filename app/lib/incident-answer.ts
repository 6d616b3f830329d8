/** What the page of an incident is told when something was not done. */
export interface IncidentAnswer {
  about: "photos" | "note";
  faults: string[];
  /** the note as it was typed */
  text: string;
}
