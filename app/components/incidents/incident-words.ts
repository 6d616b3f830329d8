import type { IncidentState, Severity } from "#app/schemas/incident.ts";

/** How a severity is set: the worse, the more it stands out; the word is always there. */
export const SEVERITY_CLASSES: Record<Severity, string> = {
  "near miss": "",
  "damaged, goes on": "font-medium",
  "wafer lost": "font-semibold",
  "danger to people": "font-semibold text-stop",
};

/** How a state is set. */
export const STATE_CLASSES: Record<IncidentState, string> = {
  open: "font-semibold",
  "followed up": "font-medium",
  closed: "text-quiet",
};

/** What a note does to the state, by the state that it leaves. */
export const STATE_CHOICES: Record<IncidentState, Record<IncidentState, string>> = {
  open: {
    open: "It stays open",
    "followed up": "Somebody follows it up",
    closed: "It is closed: cause and measure are known",
  },
  "followed up": {
    open: "",
    "followed up": "It stays followed up",
    closed: "It is closed: cause and measure are known",
  },
  closed: { open: "Open it again", "followed up": "", closed: "" },
};
