import { z } from "zod";
import type { FilmImported } from "#app/schemas/film-import.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { readUpload } from "#app/server/upload.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { applyFilmImport, planFilmImport } from "./import-films.server.ts";

/** A table of two thousand films has some 600 kB. */
const LIMIT = { bytes: 1024 * 1024, words: "1\u00A0MB" };

const seenSchema = z.record(z.uuid(), z.int()).catch({});

/**
 * Looks at a posted table of films, or applies one that was looked at. A chosen file goes before the text in the form.
 * @throws 403 for a role that may not edit films
 */
export async function filmImportForm(request: Request, scope: ActorScope): Promise<FilmImported> {
  requireOnSite(scope, "edit films");
  const { formData, files, tooLarge } = await readUpload(request, ["file"], LIMIT);
  if (tooLarge.file)
    return { outcome: "refused", reason: `${tooLarge.file.name} has more than ${LIMIT.words}. Import fewer films.` };
  const typed = formData.get("text");
  const text = files.file ? new TextDecoder().decode(files.file.bytes) : typeof typed === "string" ? typed : "";
  if (text.trim() === "") return { outcome: "refused", reason: "Choose a file, or paste its rows." };
  if (text.length > LIMIT.bytes)
    return { outcome: "refused", reason: `The rows have more than ${LIMIT.words}. Import fewer films.` };
  if (formData.get("intent") !== "apply") return planFilmImport(scope, text);
  return applyFilmImport(scope, text, new Map(Object.entries(seenSchema.parse(seenOf(formData.get("seen"))))));
}

function seenOf(posted: FormDataEntryValue | null): unknown {
  try {
    return JSON.parse(String(posted));
  } catch {
    return {};
  }
}
