import { jobJson } from "#app/lib/job-json.ts";
import { SCAN_FILE_LIMIT, tooLargeSentence } from "#app/lib/scan-file.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import { scanRequestSchema } from "#app/schemas/scan-request.ts";
import { problemJson } from "#app/server/problem-json.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { readUpload } from "#app/server/upload.server.ts";
import { getImportProfile } from "../import-profiles.server.ts";
import { getJob } from "../jobs/jobs.server.ts";
import { getReading } from "../scan-readings/get-reading.server.ts";
import { importScanFiles } from "../scan-readings/import-files.server.ts";
import { scanAnswer } from "./scan-answer.server.ts";

/**
 * Takes a file in (multipart/form-data: `file`, `program`, and `import_profile` as JSON or `import_profile_id`). 201 with what the file
 * says, 200 with the same when it has been read in that way before, 202 with the job that reads a large one.
 */
export async function uploadScan(scope: ActorScope, request: Request): Promise<Response> {
  if (!/^multipart\/form-data/i.test(request.headers.get("Content-Type") ?? ""))
    return problemJson(415, "Send multipart/form-data with the file in the field “file”.");
  const { formData, files, tooLarge } = await readUpload(request, ["file"], SCAN_FILE_LIMIT);
  const { file } = files;
  if (tooLarge.file) return problemJson(413, tooLargeSentence(tooLarge.file.name, tooLarge.file.size));
  const parsed = scanRequestSchema.safeParse(Object.fromEntries(formData));
  const faults = (parsed.error?.issues ?? []).map(({ path, message }) => ({
    pointer: `/${path.join("/")}`,
    detail: message,
  }));
  if (!file) faults.unshift({ pointer: "/file", detail: "Send the file in the field “file”." });
  if (!parsed.success || !file) return problemJson(422, "Something in the request is wrong.", { errors: faults });

  const { program: slug, edge_exclusion_m: edgeExclusion, import_profile, import_profile_id } = parsed.data;
  const program = scope.actor.memberships.find(({ programSlug }) => programSlug === slug);
  if (!program || !mayInProgram(scope.actor, "see the work", program.programId))
    return problemJson(404, `There is no program “${slug}”, or it is not yours.`);
  const profile = import_profile ?? (import_profile_id ? await getImportProfile(scope, import_profile_id) : {});
  const imported = await importScanFiles(scope, {
    program: program.programId,
    files: [file],
    settings: { profile, edgeExclusion },
  });
  switch (imported.outcome) {
    case "refused":
      return problemJson(422, imported.reason, { errors: imported.faults });
    case "job":
      return Response.json(jobJson(await getJob(scope, imported.job)), {
        status: 202,
        headers: { Location: `/api/v1/jobs/${imported.job}`, "Cache-Control": "no-store" },
      });
    default:
      return scanAnswer(request, await getReading(scope, imported.reading), imported.outcome === "read" ? 201 : 200);
  }
}
