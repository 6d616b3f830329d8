import { data, redirect } from "react-router";
import type { IncidentAnswer } from "#app/lib/incident-answer.ts";
import { followUpSchema } from "#app/schemas/incident-form.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { followUp } from "./follow-up.server.ts";
import { incidentPage } from "./incident-page.server.ts";
import { addPhotos } from "./keep-photos.server.ts";
import { postedPhotos } from "./report-form.server.ts";

const answer = (status: 400 | 409, about: IncidentAnswer["about"], faults: string[], text = "") =>
  data<IncidentAnswer>({ about, faults, text }, { status });

/**
 * Adds photos or a note, by what the form says, and leads back to the page.
 * @throws 403 for a role that may not, 404 for an incident that is not the person's own
 */
export async function incidentForm(request: Request, scope: ActorScope, incidentId: string | undefined) {
  // Who may not see it is told so before anything is read.
  const { id } = await incidentPage(scope, incidentId);
  const { formData, files, faults } = await postedPhotos(request);
  if (formData.get("intent") === "photos") {
    const refused = faults.length > 0 ? faults : await addPhotos(scope, id, files);
    if (refused.length > 0) return answer(400, "photos", refused);
    throw redirect(`/incidents/${id}`);
  }
  const submission = parseForm(formData, followUpSchema);
  const typed = formData.get("text");
  const text = typeof typed === "string" ? typed : "";
  if (submission.status !== "success")
    return answer(
      400,
      "note",
      Object.values(submission.error ?? {}).flatMap((messages) => messages ?? []),
      text,
    );
  const refused = await followUp(scope, id, submission.value);
  if (refused !== null) return answer(409, "note", [refused], text);
  throw redirect(`/incidents/${id}`);
}
