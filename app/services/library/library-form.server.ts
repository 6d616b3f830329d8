import { data, redirect } from "react-router";
import type { z } from "zod";
import { bondingMaterialSchema } from "#app/schemas/bonding-material.ts";
import { carrierSchema } from "#app/schemas/carrier.ts";
import { equipmentSchema } from "#app/schemas/equipment.ts";
import { filmSchema } from "#app/schemas/film.ts";
import type { LibraryKey } from "#app/schemas/library-records.ts";
import { siliconSchema } from "#app/schemas/silicon.ts";
import { tapeSchema } from "#app/schemas/tape.ts";
import { readForm, refusal, versionOf } from "#app/server/form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { LIBRARY } from "./kinds.server.ts";
import { saveLibraryRecord } from "./library.server.ts";

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
    return data({ ...refusal(submission, null, what), version, savedAs: null }, { status: 400 });
  const saved = await saveLibraryRecord(scope, key, { id, version, values: submission.value });
  if (saved.outcome === "saved" && stay) return data({ lastResult: null, version: null, savedAs: saved.id });
  if (saved.outcome === "saved") throw redirect(`${list}/${saved.id}`);
  const answer = refusal(submission, saved, what);
  return data({ ...answer, version: answer.version ?? version, savedAs: null }, { status: 409 });
}
