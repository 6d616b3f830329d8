import type { EntityManager } from "@mikro-orm/postgresql";
import { Scan } from "#app/db/entities/scan.ts";
import { ScanFile } from "#app/db/entities/scan-file.ts";
import { stoneyStressWorking } from "#app/engine/stoney/working.ts";
import { shownWorking } from "#app/lib/shown-working.ts";
import { waferLabel } from "#app/lib/wafer-label.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { mayInProgram, programsWhere, type ProgramPermission } from "#app/policies/permissions.ts";
import type { Actor } from "#app/policies/roles.ts";
import type { ScanDetail, ScanRow } from "#app/schemas/scan-view.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { analyseScans, FOR_ANALYSIS } from "./film-analysis/analyse-scans.server.ts";
import { everyWord } from "./like.server.ts";
import { requireInProgram } from "./permission.server.ts";
import { programFilter } from "./program-filter.server.ts";
import { idFrom } from "./uuid.server.ts";
import { useOfScan } from "./wafers/undo-import.server.ts";
import { labelled } from "./wafers/wafer-of.ts";

/** The programs in which the person may do this with scans; somebody who may nowhere is refused. */
export function scanPrograms({ actor }: ActorScope, permission: ProgramPermission): Actor["memberships"] {
  const programs = programsWhere(actor, permission);
  if (programs.length === 0)
    throw problem(403, `Your role may not ${permission}. Ask the process owner of your program.`);
  return programs;
}

export const SCAN_SORTS = ["uploaded", "label", "film", "stress", "bow", "program", "person"] as const;

function orderOf({ sort, descending }: ListParams) {
  const direction = descending ? "desc nulls last" : "asc nulls last";
  switch (sort) {
    case "label":
      return { label: direction };
    case "film":
      return { film: { name: direction } };
    case "stress":
      return { stress: direction };
    case "bow":
      return { bowChange: direction };
    case "program":
      return { program: { name: direction } };
    case "person":
      return { createdBy: { name: direction } };
    default:
      return { createdAt: direction };
  }
}

/** A page of the scans that the person may see. Searched by wafer, film and person. */
export async function listScans(scope: ActorScope, params: ListParams): Promise<ListPage<ScanRow>> {
  scanPrograms(scope, "see the work");
  return inScope(scope, async (em) => {
    const [scans, total] = await em.findAndCount(
      Scan,
      {
        program: programFilter(scope.actor, "see the work", params.filters["program"]),
        ...(params.query
          ? everyWord(params.query, (pattern) => ({
              $or: [{ label: pattern }, { film: { name: pattern } }, { createdBy: { name: pattern } }],
            }))
          : {}),
      },
      {
        populate: ["program", "film", "createdBy"],
        orderBy: [orderOf(params), { id: "asc" }] as never,
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    return { rows: scans.map(rowOf), total, params };
  });
}

function rowOf(scan: Scan & { program: { name: string }; createdBy: { name: string } }): ScanRow {
  return {
    id: scan.id,
    label: scan.label,
    program: scan.program.name,
    film: scan.film?.name ?? null,
    diameter: scan.parameters.diameter,
    stress: scan.stress,
    stressUncertainty: scan.stressUncertainty,
    bowChange: scan.bowChange,
    bowUncertainty: scan.bowUncertainty,
    curled: scan.curled,
    createdAt: scan.createdAt.toISOString(),
    createdBy: scan.createdBy.name,
  };
}

/** The newest scans of some programs, within a transaction that is already open. */
export async function latestScans(em: EntityManager, programs: string[], limit: number): Promise<ScanRow[]> {
  const scans = await em.find(
    Scan,
    { program: { $in: programs } },
    { populate: ["program", "film", "createdBy"], orderBy: [{ createdAt: "desc" }, { id: "asc" }], limit },
  );
  return scans.map(rowOf);
}

/** One scan, as it was stored. */
export async function getScan(scope: ActorScope, id: string | undefined): Promise<ScanDetail> {
  return inScope(scope, async (em) => {
    const scan = await em.findOne(
      Scan,
      { id: idFrom(id, "scan") },
      { populate: [...FOR_ANALYSIS, "program", "wafer.lot", "createdBy"] },
    );
    if (!scan) throw notFound("scan");
    requireInProgram(scope, "see the work", scan.program.id, "scan");
    const { program, film, parameters } = scan;
    const result = scan.result.get();
    const { analysis } = await analyseScans(em, [scan as Scan]);
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
        ? {
            id: film.id,
            name: film.name,
            stress: film.stress.value,
            stressTolerance: film.stress.tolerance,
            source: film.stress.source,
          }
        : null,
      files: { before: file(scan.before), after: file(scan.after) },
      placed: placeOf(scan),
      undo: {
        may: mayInProgram(scope.actor, "upload scans", program.id),
        use: await useOfScan(em, scan.id),
      },
      parameters,
      result,
      working: shownWorking(
        stoneyStressWorking({
          curvatureChange: result.curvatureChange,
          filmThickness: parameters.filmThickness,
          substrateThickness: parameters.siliconThickness,
          biaxialModulus: result.biaxialModulus,
        }),
      ),
      analysis,
      engineVersion: scan.engineVersion,
      createdAt: scan.createdAt.toISOString(),
      createdBy: scan.createdBy.name,
    };
  });
}

function placeOf({ wafer, azimuth, instrumentName }: Scan): ScanDetail["placed"] {
  if (!wafer) return null;
  return {
    wafer: { id: wafer.id, label: waferLabel(labelled(wafer)) },
    azimuth: azimuth ?? null,
    instrument: instrumentName,
  };
}

/** The raw bytes of a file, exactly as they came. */
export async function getScanFile(
  scope: ActorScope,
  id: string | undefined,
): Promise<{ name: string; bytes: Uint8Array<ArrayBuffer> }> {
  return inScope(scope, async (em) => {
    const file = await em.findOne(ScanFile, { id: idFrom(id, "scan file") }, { populate: ["program", "bytes"] });
    if (!file) throw notFound("scan file");
    requireInProgram(scope, "see the work", file.program.id, "scan file");
    return { name: file.name, bytes: new Uint8Array(file.bytes.get()) };
  });
}
