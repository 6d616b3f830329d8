import { data, redirect } from "react-router";
import type { z } from "zod";
import { bondingMaterialSchema } from "#app/schemas/bonding-material.ts";
import { carrierSchema } from "#app/schemas/carrier.ts";
import { equipmentSchema } from "#app/schemas/equipment.ts";
import { filmSchema } from "#app/schemas/film.ts";
import { filmChanges } from "#app/lib/film-csv/changes.ts";
import type { RecordConflict } from "#app/lib/record-conflict.ts";
import type { FilmValues } from "#app/schemas/film.ts";
import type { LibraryKey } from "#app/schemas/library-records.ts";
import { siliconSchema } from "#app/schemas/silicon.ts";
import { tapeSchema } from "#app/schemas/tape.ts";
import { readForm, refusal, versionOf } from "#app/server/form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { LIBRARY } from "./kinds.server.ts";
import type { Saved } from "../record.server.ts";
import { getLibraryRecord, saveLibraryRecord } from "./library.server.ts";

const SCHEMAS: Record<LibraryKey, z.ZodType<{ name: string }>> = {
  film: filmSchema,
  silicon: siliconSchema,
  carrier: carrierSchema,
  bondingMaterial: bondingMaterialSchema,
  tape: tapeSchema,
  equipment: equipmentSchema,
};

/**
 * Saves a posted record of the library: a new one when `id` is null. Once saved, leads to the record, below the address `list`;
 * or, with `stay`, is told its id, for a form beside another one;
 * otherwise everything typed goes back with what is wrong (400) or with who was faster or has the name already (409).
 * @throws 403 for a role that may not edit this kind, 404 when the id names nothing
 */
export async function saveLibraryForm(
  request: Request,
  scope: ActorScope,
  key: LibraryKey,
  { id, list, stay = false }: { id: string | null; list: string; stay?: boolean },
) {
  const { what, edit } = LIBRARY[key];
  requireOnSite(scope, edit);
  const { formData, submission } = await readForm(request, SCHEMAS[key]);
  const version = versionOf(formData);
  // What was read with an older version stays of that version until the person has been told of the newer one.
  if (submission.status !== "success")
    return data({ ...refusal(submission, null, what), version, savedAs: null, conflict: null }, { status: 400 });
  const saved = await saveLibraryRecord(scope, key, { id, version, values: submission.value });
  if (saved.outcome === "saved" && stay)
    return data({ lastResult: null, version: null, savedAs: saved.id, conflict: null });
  if (saved.outcome === "saved") throw redirect(`${list}/${saved.id}`);
  const answer = refusal(submission, saved, what);
  const conflict = await conflictWith(scope, key, id, submission.value, saved);
  return data({ ...answer, version: answer.version ?? version, savedAs: null, conflict }, { status: 409 });
}

/** What somebody else has saved meanwhile beside what was sent, property by property; for films, whose properties have words. */
async function conflictWith(
  scope: ActorScope,
  key: LibraryKey,
  id: string | null,
  values: unknown,
  saved: Saved,
): Promise<RecordConflict | null> {
  if (saved.outcome !== "conflict" || key !== "film" || id === null) return null;
  const { record, stamp } = await getLibraryRecord(scope, "film", id);
  const rows = filmChanges(record, values as FilmValues).map(({ label, from, to }) => ({
    label: label.charAt(0).toUpperCase() + label.slice(1),
    theirs: from,
    mine: to,
  }));
  return { by: stamp.updatedBy, rows };
}
