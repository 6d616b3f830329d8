import type { FlowInput } from "#app/engine/flow/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { Catalogue } from "#app/engine/trial/catalogue.ts";

/** Why nothing can be tried on a copy: an assessment that is out of date, or a role that may not change flows. */
export type TrialBar = "out of date" | "role";

/** What the pages of trials say of the assessment that they belong to. */
export interface TrialHead {
  id: string;
  /** 'A' */
  revision: string;
  flow: { id: string; name: string };
  /** number and slots of the leg that is tried on, of a flow that parts by slot */
  leg: { number: number; slots: string } | null;
  barred: TrialBar | null;
  /** whether the person may have the inputs, to work things out in the browser */
  mayAssess: boolean;
}

/** What the engine needs to try changes of an assessed flow, wherever it runs. */
export interface TrialQuestion {
  flow: FlowInput;
  limits: SiteLimits;
  catalogue: Catalogue;
}

/** The same on its way to the browser, with what the page says. */
export interface SentTrial {
  head: TrialHead;
  question: TrialQuestion;
}
