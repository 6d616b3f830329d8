import type { Outcome } from "#app/engine/vocabulary.ts";
import type { TrialHead } from "./trial.ts";

/** One carrier and bond as the finder lists it. SI. */
export interface FinderRow {
  /** 'carrier material thickness' */
  key: string;
  carrier: string;
  material: string;
  release: string;
  thickness: number;
  planned: boolean;
  fits: boolean;
  outcome: Outcome;
  /** share of a limit left at the tightest finding; null where nothing judged has a limit */
  margin: number | null;
  /** where the tightest finding is */
  tightest: { step: number; rule: number } | null;
  /** of what does not fit: the first reason */
  reason: { step: number; rule: number | null; text: string; figure: string | null; limit: string | null } | null;
  /** what is posted to try it; null for what is planned already */
  posted: string | null;
}

/** A bond of the flow that the finder can be asked about. */
export interface FinderBond {
  index: number;
  label: string;
}

/** What the finder's page was asked. */
export interface FinderAsked {
  bond: number;
  /** as typed */
  targetStep: string;
  targetWarp: string;
  faults: { targetStep?: string; targetWarp?: string };
}

export interface FinderPageData {
  head: TrialHead;
  bonds: FinderBond[];
  steps: { number: number; title: string }[];
  asked: FinderAsked;
  /** how many were tried and how many of them fit, before search and filter */
  tried: number;
  fits: number;
}
