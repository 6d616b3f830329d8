import { createHash } from "node:crypto";
import { Scan } from "#app/db/entities/scan.ts";
import { readProfileBy } from "#app/lib/scan-reading/one-profile.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { ScanSubject } from "#app/schemas/scan.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "./permission.server.ts";
import { uploadReadAs, type ScanFiles, type Uploaded } from "./scan-upload.server.ts";

/** What came of a pair: kept now, kept already by an earlier import, or refused with a reason. */
export type Imported = Uploaded | { outcome: "already"; id: string };

/**
 * Reads a pair of files again, each by the import profile that it was read by in the browser, and keeps it in a transaction of its
 * own. A pair whose two files are a scan of the program already is not kept twice.
 * @throws 404 for a program in which the person may not upload scans
 */
export async function importPair(
  scope: ActorScope,
  values: ScanSubject,
  files: ScanFiles,
  profiles: { before: ImportProfile; after: ImportProfile },
): Promise<Imported> {
  requireInProgram(scope, "upload scans", values.program, "program");
  const [before, after] = [hashOf(files.before.bytes), hashOf(files.after.bytes)];
  const known = await inScope(scope, (em) =>
    em.findOne(
      Scan,
      { program: values.program, before: { hash: before }, after: { hash: after } },
      { orderBy: { createdAt: "desc" } },
    ),
  );
  if (known) return { outcome: "already", id: known.id };
  return uploadReadAs(scope, values, files, (which, { bytes, name }) => readProfileBy(bytes, name, profiles[which]));
}

const hashOf = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");
