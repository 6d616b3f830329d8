import type { Submission } from "@conform-to/react";
import type { FlowConflict } from "#app/schemas/flow-plan.ts";
import type { Saved } from "../record.server.ts";

/** The answer to a step of the library that was not saved: everything typed goes back, with what is wrong. */
export function templateRefusal<Value>(submission: Submission<Value>, saved?: Saved) {
  if (saved?.outcome === "name taken")
    return {
      lastResult: submission.reply({
        fieldErrors: { title: ["There is already a step of that name in the library."] },
      }),
      version: null,
      conflict: null,
    };
  const conflict: FlowConflict | null =
    saved?.outcome === "conflict" ? { ...saved.conflict, changes: [], step: null } : null;
  return { lastResult: submission.reply(), version: conflict?.version ?? null, conflict };
}
