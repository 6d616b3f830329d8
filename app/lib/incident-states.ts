import type { IncidentState } from "#app/schemas/incident.ts";

const NEXT: Record<IncidentState, readonly IncidentState[]> = {
  open: ["open", "followed up", "closed"],
  "followed up": ["followed up", "closed"],
  closed: ["open"],
};

/** The states that an incident may have after its next note; the database holds the same. */
export function nextStates(state: IncidentState): readonly IncidentState[] {
  return NEXT[state];
}
