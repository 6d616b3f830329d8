import type { PredictedBow } from "#app/lib/predicted-bow.ts";

/** A bow recorded after a step of an assessment; SI, standard uncertainties, standard bow. */
export interface StepMeasurementRow {
  id: string;
  step: number;
  title: string;
  lot: string;
  wafer: string;
  bow: number;
  standardUncertainty: number;
  stated: boolean;
  predicted: number;
  predictedUncertainty: number;
  instrument: string;
  measuredAt: string;
  createdAt: string;
  createdBy: string;
  setAside: { reason: string; at: string; by: string } | null;
}

/** A summary of a lot that has bows and may be placed at a step. */
export interface SummaryChoice {
  /** names reading and lot in the form */
  value: string;
  lot: string;
  wafers: number;
  /** ISO day */
  measuredOn: string;
  /** how it was measured, where that is known: no other answer is asked then */
  known: boolean;
}

/** The page on which bows are recorded beside an assessment. */
export interface StepMeasurements {
  assessment: { id: string; number: number; lot: string | null };
  flow: { id: string; name: string };
  program: string;
  /** steps after which a bow can be compared, with what is predicted where the flow does not part by slot */
  steps: (Pick<PredictedBow, "step" | "title"> & { predicted: PredictedBow | null })[];
  summaries: SummaryChoice[];
  rows: StepMeasurementRow[];
  mayRecord: boolean;
  maySetAside: boolean;
}
