import { LARGEST_FILE, LARGEST_FILE_WORDS, tooLargeSentence } from "#app/lib/scan-file.ts";
import { profileFileSchema, tableFileSchema, type FileAnswer } from "#app/schemas/scan-import.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { readUpload } from "#app/server/upload.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import { importFile } from "#app/services/wafers/import-file.server.ts";
import type { Route } from "./+types/import-file";

/** What a page may send here is sent by the import screen; there is nothing to look at. */
export function loader({ context }: Route.LoaderArgs): never {
  scanPrograms(scopeOf(context), "upload scans");
  throw problem(404, "Nothing is shown here. Import files from the page of the scans.");
}

/** Fields that each file has of its own; a fault there is no fault of what the batch shares. */
const OF_FILE = /^(?:wafer|lot|slot|side|lines|profile|instrument)\b/;
const answer = (said: FileAnswer) =>
  Response.json(said, { status: said.outcome === "placed" || said.outcome === "measured" ? 201 : 200 });

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
