import { keptOf } from "#app/lib/job-files.ts";
import { LARGEST_FILE, LARGEST_FILE_WORDS, tooLargeSentence } from "#app/lib/scan-file.ts";
import { profileFileSchema, tableFileSchema, type FileAnswer, type FileUnderWay } from "#app/schemas/scan-import.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { readUpload } from "#app/server/upload.server.ts";
import { getJob } from "#app/services/jobs/jobs.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import { importFile } from "#app/services/wafers/import-file.server.ts";
import type { Route } from "./+types/import-file";

/** How far the reading of a large file is, for the import screen that waits for it; there is nothing else to look at. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  scanPrograms(scope, "upload scans");
  const id = url.searchParams.get("job");
  if (id === null) throw problem(404, "Nothing is shown here. Import files from the page of the scans.");
  const { state, done, total, sentence, outcome } = await getJob(scope, id);
  const under: FileUnderWay = { state, done, total, sentence, kept: keptOf(outcome) };
  return Response.json(under, { headers: { "Cache-Control": "no-store" } });
}

/** Fields that each file has of its own; a fault there is no fault of what the batch shares. */
const OF_FILE = /^(?:wafer|lot|slot|side|lines|profile|instrument)\b/;
const STATUS: Partial<Record<FileAnswer["outcome"], number>> = { placed: 201, measured: 201, job: 202 };
const answer = (said: FileAnswer) => Response.json(said, { status: STATUS[said.outcome] ?? 200 });

/** Takes one file of an import and says what came of it; a refusal is an answer like any other, for its line in the list. */
export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  scanPrograms(scope, "upload scans");
  const { files, tooLarge, formData } = await readUpload(request, ["file"], {
    bytes: LARGEST_FILE,
    words: LARGEST_FILE_WORDS,
  });
  if (tooLarge.file)
    return answer({ outcome: "refused", reason: tooLargeSentence(tooLarge.file.name, tooLarge.file.size) });
  if (!files.file) return answer({ outcome: "refused", reason: "No file arrived. Choose it again." });
  // Only profiles lie on a line; a table says itself of which wafers it is.
  const submission = formData.has("lines")
    ? parseForm(formData, profileFileSchema)
    : parseForm(formData, tableFileSchema);
  if (submission.status === "success") return answer(await importFile(scope, submission.value, files.file));
  const errors = errorsOf(submission.reply().error ?? {});
  const [own] = Object.entries(errors).flatMap(([field, said]) => (OF_FILE.test(field) ? said : []));
  return answer(own === undefined ? { outcome: "fields", errors } : { outcome: "refused", reason: own });
}

const errorsOf = (errors: Record<string, string[] | null>) =>
  Object.fromEntries(Object.entries(errors).flatMap(([field, said]) => (said ? [[field, said]] : [])));
