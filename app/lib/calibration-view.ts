import type { SubmissionResult } from "@conform-to/react";
import type { Calibrated } from "#app/engine/calibration/pair-model.ts";
import type { ShownWorking } from "./shown-working.ts";

/** What a calibration may fit, by its name in the form. */
export const FITS = {
  both: { label: "Locked-in modulus and carrier expansion", quantities: ["lockedInModulus", "carrierExpansion"] },
  modulus: { label: "Locked-in modulus alone", quantities: ["lockedInModulus"] },
  expansion: { label: "Carrier expansion alone", quantities: ["carrierExpansion"] },
} as const satisfies Record<string, { label: string; quantities: readonly Calibrated[] }>;
export type Fit = keyof typeof FITS;
export const FIT_NAMES = Object.keys(FITS) as [Fit, ...Fit[]];

/** A step after which the pair has a bow to be measured. */
export interface PairStep {
  number: number;
  title: string;
  /** standard bow at 25 °C with the values as they are stated */
  bow: string;
}

/** The flow whose pairs were measured, as far as a calibration needs it; text where it is only shown. */
export interface CalibrationFlow {
  id: string;
  name: string;
  /** carrier of its bonds, with its stated expansion; null where that is silicon's own */
  carrier: { id: string; name: string; expansion: string | null };
  steps: PairStep[];
  fits: Fit[];
  /** why it cannot be computed as it is */
  fault: string | null;
  mayCalibrate: boolean;
}

/** What the page of a calibration shows before anything is computed. */
export interface CalibrationPage {
  material: { id: string; name: string; modulus: string };
  /** flows of the person's own programs whose bonds are all of this material and of one carrier */
  flows: { value: string; label: string }[];
  chosen: CalibrationFlow | null;
  mayUse: boolean;
}

/** A fitted value beside the one that was stated; ± is the expanded uncertainty, k = 2. */
export interface FittedValue {
  label: string;
  of: string;
  stated: string;
  fitted: string;
}

/** One measured bow beside the computed ones; µm without the unit. */
export interface ResidualRow {
  step: number;
  title: string;
  measured: string;
  stated: string;
  fitted: string;
  residual: string;
  uncertainty: string;
}

export type CalibrationResult =
  | {
      kind: "fitted";
      answer: string;
      /** what the scatter of the bows says of the fit; `doubt` when they do not fit together */
      scatter: string;
      doubt: boolean;
      values: FittedValue[];
      correlation: string | null;
      residuals: ResidualRow[];
      /** the calculation behind each value */
      workings: ShownWorking[];
      /** what was fitted, to be sent back with 'Use these values' */
      sent: [name: string, value: string][];
    }
  | { kind: "refused"; reason: string; wouldHelp: string | null };

/** What a posted form is answered with. */
export interface CalibrationAnswer {
  lastResult: SubmissionResult<string[]> | null;
  result: CalibrationResult | null;
}
