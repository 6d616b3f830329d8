import { data, redirect } from "react-router";
import { fileSize } from "#app/lib/file-size.ts";
import { incidentSchema } from "#app/schemas/incident-form.ts";
import { MOST_PHOTOS, PHOTO_LIMIT } from "#app/schemas/incident-photo.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { readUploads } from "#app/server/upload.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { reportIncident } from "./report-incident.server.ts";

/** Files of a posted form, and of those that are too large what is told at their field. */
export async function postedPhotos(request: Request) {
  const { formData, files, tooLarge } = await readUploads(request, "photos", MOST_PHOTOS, PHOTO_LIMIT);
  const faults = tooLarge.map(
    ({ name, size }) =>
      `“${name}” has ${fileSize(size)}, and a photo may have up to ${PHOTO_LIMIT.words}. Choose a smaller one.`,
  );
  return { formData, files, faults };
}

/**
 * Stores a report and leads to it, or gives everything typed back with what is wrong.
 * @throws 403 for a role that may not, 404 for an assessment that is not the person's own
 */
export async function reportForm(request: Request, scope: ActorScope) {
  requireInSomeProgram(scope, "report incidents");
  const { formData, files, faults } = await postedPhotos(request);
  const submission = parseForm(formData, incidentSchema);
  if (submission.status !== "success" || faults.length > 0) {
    const status = faults.length > 0 ? 413 : 400;
    return data(
      { lastResult: submission.reply({ fieldErrors: faults.length > 0 ? { photos: faults } : {} }) },
      { status },
    );
  }
  const reported = await reportIncident(scope, submission.value, files);
  if (reported.outcome === "stored") throw redirect(`/incidents/${reported.id}`);
  const { field, reasons } = reported;
  return data({ lastResult: submission.reply({ fieldErrors: { [field]: reasons } }) }, { status: 400 });
}
