import { SCAN_FILE_LIMIT, tooLargeSentence } from "#app/lib/scan-file.ts";
import { scanImportSchema, type PairAnswer } from "#app/schemas/scan-import.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { readUpload } from "#app/server/upload.server.ts";
import { importPair } from "#app/services/scan-import.server.ts";
import { scanPrograms } from "#app/services/scans.server.ts";
import type { Route } from "./+types/import-pair";

/** What a page may send here is sent by the import screen; there is nothing to look at. */
export function loader({ context }: Route.LoaderArgs): never {
  scanPrograms(scopeOf(context), "upload scans");
  throw problem(404, "Nothing is shown here. Import files from the page of the scans.");
}

const WHICH = ["before", "after"] as const;
/** Fields that each pair has of its own; a fault there is no fault of what the batch shares. */
const OF_PAIR = /^(?:label|profileBefore|profileAfter)\b/;
const answer = (said: PairAnswer) => Response.json(said, { status: said.outcome === "stored" ? 201 : 200 });

/** Takes one pair of an import and says what came of it; a refusal is an answer like any other, for its line in the list. */
export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  scanPrograms(scope, "upload scans");
  const { files, tooLarge, formData } = await readUpload(request, WHICH, SCAN_FILE_LIMIT);
  for (const which of WHICH) {
    const large = tooLarge[which];
    if (large) return answer({ outcome: "refused", which, reason: tooLargeSentence(large.name, large.size) });
  }
  const submission = parseForm(formData, scanImportSchema);
  if (submission.status !== "success") {
    const errors = errorsOf(submission.reply().error ?? {});
    const [own] = Object.entries(errors).flatMap(([field, said]) => (OF_PAIR.test(field) ? said : []));
    return answer(own === undefined ? { outcome: "fields", errors } : { outcome: "refused", which: null, reason: own });
  }
  const { before, after } = files;
  if (!before || !after)
    return answer({ outcome: "refused", which: null, reason: "A pair is a file before the film and one after it." });
  const { profileBefore, profileAfter, ...values } = submission.value;
  const said = await importPair(scope, values, { before, after }, { before: profileBefore, after: profileAfter });
  if (said.outcome !== "refused") return answer(said);
  const { field, reason } = said;
  if (field === "film") return answer({ outcome: "fields", errors: { film: [reason] } });
  return answer({ outcome: "refused", which: field === "" ? null : field, reason });
}

const errorsOf = (errors: Record<string, string[] | null>) =>
  Object.fromEntries(Object.entries(errors).flatMap(([field, said]) => (said ? [[field, said]] : [])));
