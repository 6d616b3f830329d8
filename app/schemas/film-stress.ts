import type { Measured } from "#app/engine/measured.ts";
import type { ChartSignal, ControlLimits } from "#app/engine/profile/lot-figures/control-chart.ts";
import type { ListPage } from "#app/lib/list-params.ts";
import type { ShownWorking } from "#app/lib/shown-working.ts";

/** Whether a value counts. One that is set aside stays where it is, with the reason. */
export type FilmStressState = "accepted" | "set aside";

/** Where a value comes from, as far as the reader may know. */
export type StressOrigin =
  | { kind: "scan"; id: string; label: string; program: string }
  /** of a program that is not the reader's: no wafer, program or link */
  | { kind: "another program" }
  | { kind: "typed"; source: string };

/** A value of a film's history; SI, standard uncertainty, ISO times. */
export interface StressValueRow {
  id: string;
  version: number;
  /** counts from 1 by the time of measurement, among the values of its instrument, as its chart does */
  number: number;
  value: number;
  standardUncertainty: number;
  filmThickness: number | null;
  /** empty when nobody named one */
  instrument: string;
  measuredAt: string;
  state: FilmStressState;
  origin: StressOrigin;
  /** why it was accepted; null where that is another program's */
  reason: string | null;
  acceptedAt: string;
  acceptedBy: string;
  /** of the last time, also when it counts again */
  setAside: { reason: string; at: string; by: string } | null;
  putBack: { at: string; by: string } | null;
}

/** A stress that the film had in use; `until` null: it is in use. */
export interface StressInUseRow {
  id: string;
  stress: Measured;
  since: string;
  until: string | null;
  by: string;
}

/** The mean of the values that count, as it would stand in the library. */
export interface StressMean {
  stress: Measured;
  count: number;
  /** of the next film, Pa */
  standardUncertainty: number;
  /** of one film about the mean, Pa */
  spread: number;
  remark: string | null;
}

/** Values of one instrument in the order of their measurement, with the limits that they give. */
export interface StressChart {
  instrument: string;
  values: { value: number; standardUncertainty: number; measuredAt: string; excluded: boolean }[];
  /** of each value against the one before it that counts */
  ranges: (number | null)[];
  /** null while there are too few values, which `tooFew` says */
  limits: ControlLimits | null;
  signals: ChartSignal[];
  tooFew: string | null;
  working: ShownWorking | null;
}

/** The history of a film's stress as its page shows it. */
export interface FilmStressHistory {
  film: { id: string; version: number };
  page: ListPage<StressValueRow>;
  /** how many values there are, whatever was searched */
  all: number;
  /** instruments that have values, the one with most first */
  instruments: string[];
  chart: StressChart | null;
  mean: StressMean | null;
  meanWorking: ShownWorking | null;
  /** the film uses the mean, and follows it */
  usesMean: boolean;
  inUse: StressInUseRow[];
  mayEdit: boolean;
}
