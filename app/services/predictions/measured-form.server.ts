import { data, redirect } from "react-router";
import type { MeasuredAnswer } from "#app/lib/measured-answer.ts";
import { setAsideSchema } from "#app/schemas/stress-value-form.ts";
import { stepMeasurementSchema } from "#app/schemas/step-measurement-form.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { recordBows, setBowAside, stepMeasurements } from "./step-measurements.server.ts";

const answer = (part: Partial<MeasuredAnswer>, status: 400 | 409) =>
  data<MeasuredAnswer>({ lastResult: null, refused: null, ...part }, { status });

/**
 * Records bows after a step, or (`intent`) sets one aside or puts it back, and leads back to the page.
 * @throws 403 for a role that may not, 404 for what is not the person's own
 */
export async function measuredForm(request: Request, scope: ActorScope, assessmentId: string | undefined) {
  // Who may not see the assessment is told so before anything is read.
  const page = await stepMeasurements(scope, assessmentId);
  const back = `/assessments/${page.assessment.id}/measured`;
  const formData = await postedForm(request);
  const intent = formData.get("intent");
  const row = formData.get("row");
  const id = typeof row === "string" ? row : undefined;
  if (intent === "put back" || intent === "set aside") {
    const submission = intent === "set aside" ? parseForm(formData, setAsideSchema) : null;
    if (submission && submission.status !== "success")
      return answer({ refused: submission.error?.["reason"]?.[0] ?? "Say why this bow does not count." }, 400);
    const refused = await setBowAside(scope, assessmentId, { id, reason: submission?.value.reason ?? null });
    if (refused !== null) return answer({ refused }, 409);
    throw redirect(back);
  }
  const submission = parseForm(formData, stepMeasurementSchema);
  if (submission.status !== "success") return answer({ lastResult: submission.reply() }, 400);
  const recorded = await recordBows(scope, assessmentId, submission.value);
  if (recorded.outcome === "stored") throw redirect(back);
  const { field, reasons } = recorded;
  return answer({ lastResult: submission.reply({ fieldErrors: { [field]: reasons } }) }, 400);
}
