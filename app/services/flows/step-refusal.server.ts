import type { Submission } from "@conform-to/react";
import type { FlowConflict } from "#app/schemas/flow-plan.ts";
import type { FlowSaved } from "./change-flow.server.ts";

/** The answer to a step that was not saved: everything typed goes back, with what is wrong or who was quicker. */
export function stepRefusal<Value>(submission: Submission<Value>, saved?: FlowSaved) {
  const conflict: FlowConflict | null = saved?.outcome === "conflict" ? saved.conflict : null;
  return { lastResult: submission.reply(), version: conflict?.version ?? null, conflict };
}
