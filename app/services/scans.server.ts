import { createHash, randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Film } from "#app/db/entities/film.ts";
import { ScanFile } from "#app/db/entities/scan-file.ts";
import { Scan } from "#app/db/entities/scan.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { ProfileFileError, readProfile, type ReadProfile } from "#app/lib/profile-csv.ts";
import type { ScanParameters, ScanResult } from "#app/schemas/scan-result.ts";
import type { ScanValues } from "#app/schemas/scan.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "./like.server.ts";
import { requireInProgram } from "./permission.server.ts";
import { programFilter } from "./program-filter.server.ts";
import { scanResult } from "./scan-result-of.ts";
import { idFrom } from "./uuid.server.ts";

/** A file as the upload handed it over. */
export interface UploadedFile {
  name: string;
  bytes: Uint8Array;
}

export type Uploaded =
  { outcome: "stored"; id: string } | { outcome: "refused"; field: "before" | "after" | "form"; reason: string };

/**
 * Reads two profiles, computes the film's stress and stores raw files, inputs and result in one transaction. A pair that cannot be
 * read or computed leaves nothing behind and comes back with the reason.
 */
export async function uploadScan(
  scope: ActorScope,
  values: ScanValues,
  files: { before: UploadedFile; after: UploadedFile },
): Promise<Uploaded> {
  requireInProgram(scope, "upload scans", values.program, "program");
  const read: Partial<Record<"before" | "after", ReadProfile>> = {};
  for (const which of ["before", "after"] as const) {
    try {
      read[which] = readProfile(files[which].bytes, files[which].name, values);
    } catch (error) {
      if (error instanceof ProfileFileError) return { outcome: "refused", field: which, reason: error.message };
      throw error;
    }
  }
  const { before, after } = read;
  if (!before || !after) return { outcome: "refused", field: "form", reason: "Choose both files." };
  let result: ScanResult;
  try {
    result = scanResult(values, before, after);
  } catch (error) {
    if (error instanceof EngineInputError)
      return { outcome: "refused", field: "form", reason: `The two scans cannot be compared: ${error.reason}.` };
    throw error;
  }
  return inScope(scope, async (em): Promise<Uploaded> => {
    const film = values.film ? await em.findOne(Film, { id: values.film }) : null;
    if (values.film && !film) throw notFound("film");
    const scan = em.create(Scan, {
      id: randomUUID(),
      program: values.program,
      label: values.label,
      film,
      before: await keepFile(em, scope, values.program, files.before),
      after: await keepFile(em, scope, values.program, files.after),
      parameters: parametersOf(values),
      result,
      engineVersion: ENGINE_VERSION,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
    return { outcome: "stored", id: scan.id };
  });
}

/** The same bytes are kept once in a program, under the name they first came with. */
async function keepFile(
  em: EntityManager,
  scope: ActorScope,
  programId: string,
  file: UploadedFile,
): Promise<ScanFile> {
  const hash = createHash("sha256").update(file.bytes).digest("hex");
  const known = await em.findOne(ScanFile, { program: programId, hash });
  if (known) return known;
  const kept = em.create(ScanFile, {
    id: randomUUID(),
    program: programId,
    name: file.name.slice(0, 200),
    hash,
    size: file.bytes.length,
    bytes: Buffer.from(file.bytes),
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
  await em.flush();
  return kept;
}

function parametersOf(values: ScanValues): ScanParameters {
  const { program: _program, label: _label, film: _film, ...parameters } = values;
  return parameters;
}

export const SCAN_SORTS = ["uploaded", "label", "program"] as const;

export interface ScanRow {
  id: string;
  label: string;
  program: string;
  film: string | null;
  stress: number;
  stressUncertainty: number;
  bowChange: number;
  createdAt: string;
  createdBy: string;
}

/** A page of the scans that the person may see. */
export async function listScans(scope: ActorScope, params: ListParams): Promise<ListPage<ScanRow>> {
  return inScope(scope, async (em) => {
    const direction = params.descending ? "desc" : "asc";
    const [scans, total] = await em.findAndCount(
      Scan,
      {
        program: programFilter(scope.actor, "see the work", params.filters["program"]),
        ...(params.query ? { label: { $ilike: `%${escapeLike(params.query)}%` } } : {}),
      },
      {
        populate: ["program", "film", "createdBy"],
        orderBy: [
          params.sort === "label"
            ? { label: direction }
            : params.sort === "program"
              ? { program: { name: direction } }
              : { createdAt: params.descending ? "asc" : "desc" },
          { id: "asc" },
        ],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const rows = scans.map((scan): ScanRow => ({
      id: scan.id,
      label: scan.label,
      program: scan.program.name,
      film: scan.film?.name ?? null,
      stress: scan.result.stress,
      stressUncertainty: scan.result.stressUncertainty,
      bowChange: scan.result.bowChange,
      createdAt: scan.createdAt.toISOString(),
      createdBy: scan.createdBy.name,
    }));
    return { rows, total, params };
  });
}

export interface ScanDetail {
  id: string;
  label: string;
  program: { id: string; name: string; slug: string };
  film: { id: string; name: string; stress: number; stressTolerance: number | null } | null;
  files: Record<"before" | "after", { id: string; name: string; size: number; hash: string }>;
  parameters: ScanParameters;
  result: ScanResult;
  engineVersion: string;
  createdAt: string;
  createdBy: string;
}

/** One scan, as it was stored. */
export async function getScan(scope: ActorScope, id: string | undefined): Promise<ScanDetail> {
  return inScope(scope, async (em) => {
    const scan = await em.findOne(
      Scan,
      { id: idFrom(id, "scan") },
      { populate: ["program", "film", "before", "after", "createdBy"] },
    );
    if (!scan) throw notFound("scan");
    requireInProgram(scope, "see the work", scan.program.id, "scan");
    const { program, film } = scan;
    const file = ({ id: fileId, name, size, hash }: { id: string; name: string; size: number; hash: string }) => ({
      id: fileId,
      name,
      size,
      hash,
    });
    return {
      id: scan.id,
      label: scan.label,
      program: { id: program.id, name: program.name, slug: program.slug },
      film: film
        ? { id: film.id, name: film.name, stress: film.stress.value, stressTolerance: film.stress.tolerance }
        : null,
      files: { before: file(scan.before), after: file(scan.after) },
      parameters: scan.parameters,
      result: scan.result,
      engineVersion: scan.engineVersion,
      createdAt: scan.createdAt.toISOString(),
      createdBy: scan.createdBy.name,
    };
  });
}

/** The raw bytes of a file, exactly as they came. */
export async function getScanFile(
  scope: ActorScope,
  id: string | undefined,
): Promise<{ name: string; bytes: Uint8Array }> {
  return inScope(scope, async (em) => {
    const file = await em.findOne(ScanFile, { id: idFrom(id, "scan file") }, { populate: ["program", "bytes"] });
    if (!file) throw notFound("scan file");
    requireInProgram(scope, "see the work", file.program.id, "scan file");
    return { name: file.name, bytes: new Uint8Array(file.bytes.get()) };
  });
}
