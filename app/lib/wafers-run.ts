import { sampledWarps } from "#app/engine/flow/sample-warps.ts";
import type { TrialQuestion } from "#app/schemas/trial.ts";
import { wafersView, type WafersView } from "./wafers-view.ts";
import type { Run } from "./worker-run.ts";

/** Wafers drawn for each step: enough for a share to a third of a per cent. */
export const WAFERS = 20_000;
/** One seed for all, so that the same flow gives the same figures on every machine. */
const SEED = 1;

/**
 * Draws wafers within the tolerances of a flow and tells how their warp is spread at every step.
 * @throws EngineInputError when today's engine refuses the flow
 */
export function* wafersRun({ flow, limits }: Pick<TrialQuestion, "flow" | "limits">): Run<WafersView> {
  return wafersView(yield* sampledWarps(flow, limits, { draws: WAFERS, seed: SEED }), flow);
}
