import type { Parity } from "#app/engine/profile/lot-figures/predicted-against-measured.ts";
import type { ListPage } from "#app/lib/list-params.ts";
import type { ShownWorking } from "#app/lib/shown-working.ts";

/** What is compared. */
export const PREDICTED = ["bow", "stress"] as const;
export type Predicted = (typeof PREDICTED)[number];

/** One measured figure beside what was predicted of it; SI, standard uncertainties, standard bow. */
export interface PredictionPoint {
  id: string;
  /** step of a flow, or film: what points are grouped by */
  group: string;
  /** name of the flow; left out where it is not of one */
  flow?: string;
  /** lot and wafer, or wafer */
  name: string;
  program: string;
  predicted: number;
  predictedUncertainty: number;
  /** names what it shares the error of its prediction with; left out where each has its own */
  shared?: string;
  measured: number;
  measuredUncertainty: number;
  /** false where nobody stated the measured one's uncertainty, and the usual one was taken */
  stated: boolean;
  measuredAt: string;
  instrument: string;
  /** address of what it was measured by, or recorded on */
  path: string;
}

/** A group of points, with what the model is off by there. */
export interface PredictionGroup extends Parity {
  /** it is more than chance */
  isOff: boolean;
}

/** Predicted against measured, as its page shows it. */
export interface Predictions {
  of: Predicted;
  page: ListPage<PredictionPoint>;
  /** every point that the filters leave, for the drawing */
  points: PredictionPoint[];
  /** null without points */
  all: PredictionGroup | null;
  groups: PredictionGroup[];
  /** the same for each flow, whatever the step; empty where points are of no flow */
  flows: PredictionGroup[];
  working: ShownWorking | null;
  /** how many there are of each kind, with the same filters */
  counts: Record<Predicted, number>;
  filters: { programs: Choice[]; films: Choice[]; flows: Choice[] };
}

interface Choice {
  value: string;
  label: string;
}
