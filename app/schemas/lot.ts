import type { Outcome } from "#app/engine/vocabulary.ts";

/** A wafer as it was measured when its lot came in; standard bow and thickness in m. `thickness` null: as the flow has it. */
export interface LotWafer {
  slot: number;
  bow: number;
  thickness: number | null;
}

/** A lot as it came in. `bow` and `thickness` are the mean of its wafers where these are given one by one. SI. */
export interface LotInput {
  name: string;
  bow: number;
  thickness: number | null;
  warp: number | null;
  edgeChips: "none" | "found" | null;
  identity: "matches" | "differs" | null;
  /** sorted by slot; empty when only the mean is known */
  wafers: LotWafer[];
}

/** Where a wafer comes nearest to what its tools take. */
export interface WaferAnswer extends LotWafer {
  outcome: Outcome;
  /** null where nothing could be computed */
  at: {
    step: number;
    title: string;
    /** what it lifts at its edge, if `rolled` */
    warp: number;
    /** null where the tool has no limit for it */
    limit: number | null;
    rolled: boolean;
    /** 'edges up' or 'edges down', as it is loaded */
    lies: string;
  } | null;
  /** why it cannot be judged; null when it can */
  reason: string | null;
}

/** What a lot's assessment says besides its result: which lot, of which assessment of the flow, and each wafer by itself. */
export interface LotRecord extends LotInput {
  of: { id: string; number: number; documentNumber: number };
  answers: WaferAnswer[];
}

/** A kept lot in the list of its flow. */
export interface FlowLotRow {
  id: string;
  name: string;
  /** number of the assessment that it is of */
  number: number;
  bow: number;
  wafers: number;
  missed: number;
  outcome: Outcome;
  createdAt: string;
  createdBy: string;
}
