import type { BondSpan } from "../finder/bond-spans.ts";
import type { FlowInput } from "../flow/model.ts";
import type { StepState } from "../flow/walk.ts";
import type { Outcome, SourceKind } from "../vocabulary.ts";
import type { UnitSymbol, Working } from "../working.ts";
import type { FindingWorkings } from "./finding-workings.ts";
import type { LimitKey, SiteLimits } from "./limits.ts";

/** A number in a finding, in SI, with its working when there is one. */
export interface Figure {
  label: string;
  value: number;
  unit: UnitSymbol;
  temperaturePoint?: boolean;
  standardUncertainty?: number | null;
  working?: Working | null;
}

/** What a figure was held against, and where that limit comes from. */
export interface FindingLimit {
  label: string;
  value: number;
  unit: UnitSymbol;
  temperaturePoint?: boolean;
  source: string;
}

/** One rule's outcome at one step. `step` counts from 1. */
export interface Finding {
  rule: number;
  title: string;
  step: number;
  outcome: Outcome;
  /** one sentence in plain words */
  reason: string;
  figures: Figure[];
  limit: FindingLimit | null;
  /** what would clear it; null when it is clear */
  remedy: string | null;
}

/** Standard uncertainty of a step's sagittas, first order in the tolerances given, m. */
export interface StepUncertainty {
  atRoom: number | null;
  atPeak: number | null;
  /** what moves the sagitta at 25 °C most, largest first; m */
  budget?: { input: string; source: SourceKind; contribution: number }[];
}

export interface RuleContext {
  flow: FlowInput;
  limits: SiteLimits;
  steps: StepState[];
  uncertainty: StepUncertainty[];
  /** derivations of the figures; null leaves them out, which saves as much as the shapes cost */
  workings: FindingWorkings | null;
  /** the bond that a search tries others for: what only another bond is asked at a step that the choice leaves alone is left out */
  tried?: BondSpan;
}

/** A handling rule. `judge` looks at one step and returns what it finds, nothing when the rule has no say there. */
export interface Rule {
  number: number;
  title: string;
  judge(context: RuleContext, state: StepState): Finding[];
}

/** What a rule asks in words, and the limits that it reads, for the method page. */
export interface RuleAbout {
  asks: string;
  limits: LimitKey[];
}
