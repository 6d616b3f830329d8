import type { SubmissionResult } from "@conform-to/react";
import { incidentSchema } from "#app/schemas/incident-form.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { findFloorLot } from "../floor/lot-sheet.server.ts";
import { reportIncident } from "./report-incident.server.ts";

interface Photos {
  files: readonly UploadedFile[];
  /** why some did not come, a sentence each */
  faults: string[];
}

/**
 * Takes the report of an incident from the screen of a lot, which the address names; it happened when it was entered.
 * @throws 403 for a role that may not, 404 for a lot or an assessment that is not the person's own, or of two programs
 */
export async function reportFromFloor(
  scope: ActorScope,
  lotId: string,
  form: FormData,
  { files, faults }: Photos,
): Promise<{ outcome: "stored" } | { outcome: "refused"; lastResult: SubmissionResult<string[]> }> {
  form.set("lot", await lotName(scope, lotId, form.get("assessment")));
  const at = form.get("at");
  const when = typeof at === "string" ? at : new Date().toISOString();
  form.set("occurredAt", when.slice(0, 16));
  const submission = parseForm(form, incidentSchema);
  if (submission.status !== "success" || faults.length > 0)
    return {
      outcome: "refused",
      lastResult: submission.reply({ fieldErrors: faults.length > 0 ? { photos: faults } : {} }),
    };
  const reported = await reportIncident(scope, submission.value, files);
  if (reported.outcome === "stored") return { outcome: "stored" };
  return {
    outcome: "refused",
    lastResult: submission.reply({ fieldErrors: { [reported.field]: reported.reasons } }),
  };
}

async function lotName(scope: ActorScope, lotId: string, assessmentId: FormDataEntryValue | null): Promise<string> {
  return inScope(scope, async (em) => {
    const lot = await findFloorLot(em, scope, lotId);
    const assessment = await findAssessment(em, scope, typeof assessmentId === "string" ? assessmentId : undefined);
    if (assessment.program.id !== lot.program.id) throw notFound("assessment");
    return lot.name;
  });
}
