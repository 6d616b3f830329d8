import { data, redirect } from "react-router";
import { acceptSchema } from "#app/schemas/accept-form.ts";
import { readForm, refusal, versionOf } from "#app/server/form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { acceptance, acceptScan } from "./accept-scan.server.ts";

/**
 * Accepts a scan as its form says and leads to the film's history. Everything typed goes back with what is wrong (400), or with who
 * was faster (409).
 * @throws 403 for a role that may not, 404 for a scan that is not the person's own
 */
export async function acceptForm(request: Request, scope: ActorScope, scanId: string | undefined) {
  const { formData, submission } = await readForm(request, acceptSchema);
  if (submission.status !== "success") {
    // Whether the person may is told before what is wrong with the form.
    await acceptance(scope, scanId);
    return data({ ...refusal(submission, null, "film") }, { status: 400 });
  }
  const version = versionOf(formData);
  const accepted = await acceptScan(scope, scanId, { version, values: submission.value });
  if (accepted.outcome === "saved") throw redirect(`/films/${accepted.id}#history`);
  if (accepted.outcome === "refused")
    return data({ lastResult: submission.reply({ formErrors: [accepted.reason] }) }, { status: 409 });
  const { by, at } = accepted.conflict;
  const changed = `${by} saved this film at ${at.slice(0, 16).replace("T", " ")} UTC, after you had opened this page. What accepting does now stands below: look at it and accept again.`;
  return data({ lastResult: submission.reply({ formErrors: [changed] }) }, { status: 409 });
}
