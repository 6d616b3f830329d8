import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { ChartOthers } from "./stack-chart.ts";
import type { StackChoices } from "./stack-draft.ts";
import type { StackView } from "./stack-view.ts";

/** What the page of a stack shows besides the stack itself. */
export interface StackAround {
  choices: StackChoices;
  limits: SiteLimits;
  view: StackView;
  /** the stack that is laid over */
  overlay: ChartOthers["overlay"];
  /** stacks that may be laid over */
  others: readonly { id: string; name: string; program: string }[];
}
