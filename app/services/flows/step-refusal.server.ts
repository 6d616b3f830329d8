import type { Submission } from "@conform-to/react";
import type { FlowConflict } from "#app/schemas/flow-plan.ts";
import type { StepSaved } from "./steps.server.ts";

/** The answer to a step that was not saved: everything typed goes back, with what is wrong or who was quicker. */
export function stepRefusal<Value>(submission: Submission<Value>, saved?: StepSaved) {
  const conflict: FlowConflict | null = saved?.outcome === "conflict" ? saved.conflict : null;
  const wrong = {
    fieldErrors: {
      "handling.carrierPiece": ["That is a piece of another carrier. Choose one of the carrier that is bonded."],
    },
  };
  const lastResult = submission.reply(saved?.outcome === "other piece" ? wrong : undefined);
  return { lastResult, version: conflict?.version ?? null, conflict };
}
