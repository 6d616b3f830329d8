/** Why nothing can be tried on a copy: an assessment that is out of date, or a role that may not change flows. */
export type TrialBar = "out of date" | "role";

/** What the pages of trials say of the assessment that they belong to. */
export interface TrialHead {
  id: string;
  /** 'A' */
  revision: string;
  flow: { id: string; name: string };
  barred: TrialBar | null;
}
