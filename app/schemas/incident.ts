import type { StepKind } from "#app/engine/flow/model.ts";
import type { SupportClass } from "#app/engine/vocabulary.ts";

/** What can happen to a wafer on the floor. */
export const INCIDENT_KINDS = ["crack", "chip", "edge chip", "delamination", "void", "slip", "drop", "other"] as const;
export type IncidentKind = (typeof INCIDENT_KINDS)[number];

/** How bad it was, mildest first. */
export const SEVERITIES = ["near miss", "damaged, goes on", "wafer lost", "danger to people"] as const;
export type Severity = (typeof SEVERITIES)[number];

/** How far an incident is followed up. One that is closed can be opened again. */
export const INCIDENT_STATES = ["open", "followed up", "closed"] as const;
export type IncidentState = (typeof INCIDENT_STATES)[number];

/** A place on a wafer drawn with its device side towards the reader and the notch down. */
export interface WaferSpot {
  /** share of the radius, 0 to 1 */
  radius: number;
  /** rad from the notch, counter-clockwise, 0 to below 2π */
  azimuth: number;
}

/** What the assessment said of the step when the incident was reported; SI. */
export interface StoodPrediction {
  stepKind: StepKind;
  stepTitle: string;
  silicon: number;
  planned: SupportClass;
  required: SupportClass;
  /** as it is held at 25 °C; null where it is held flat */
  warp: number | null;
  warpUncertainty: number | null;
  /** the films on the wafer once the step has been done, by name */
  films: string;
}

/** A picture of an incident, without its bytes. */
export interface PhotoView {
  id: string;
  width: number;
  height: number;
  size: number;
  addedAt: string;
  addedBy: string;
}

/** What somebody noted of an incident, and the state that it had from then on. */
export interface IncidentNoteView {
  id: string;
  state: IncidentState;
  text: string;
  at: string;
  by: string;
}

/** All that is known of an incident. */
export interface IncidentView {
  id: string;
  /** 'TERN-I003' */
  number: string;
  program: string;
  assessment: { id: string; number: string; flow: string; lot: string | null };
  step: number;
  lot: { id: string; name: string };
  wafer: { id: string; name: string } | null;
  kind: IncidentKind;
  severity: Severity;
  spot: WaferSpot | null;
  affected: number;
  broken: number;
  /** wafers of the lot that went through the step, those with an incident among them; null where nobody knows */
  through: number | null;
  words: string;
  occurredAt: string;
  reportedAt: string;
  reportedBy: string;
  state: IncidentState;
  prediction: StoodPrediction;
  notes: IncidentNoteView[];
  photos: PhotoView[];
  mayReport: boolean;
  mayFollowUp: boolean;
}

/** What the form of a report offers once its assessment is chosen. */
export interface ReportGround {
  assessment: { id: string; number: string; flow: string; program: string; lot: string | null };
  /** legs of a flow that parts by slot, by their number; empty where it does not */
  legs: { value: string; label: string }[];
  steps: { value: string; label: string }[];
  /** names of the lots of the program, the newest first */
  lots: string[];
  /** what the address brings along, an id for the report, and now, in UTC */
  given: { id: string; step: string; leg: string; lot: string; wafer: string; occurredAt: string };
}

/** An incident as a row of the review board's list. */
export interface IncidentRow {
  id: string;
  number: string;
  program: string;
  kind: IncidentKind;
  severity: Severity;
  state: IncidentState;
  lot: string;
  wafer: string | null;
  step: number;
  stepTitle: string;
  support: SupportClass;
  silicon: number;
  films: string;
  affected: number;
  broken: number;
  through: number | null;
  occurredAt: string;
  reportedBy: string;
  words: string;
}
