import { WaferScan } from "#app/db/entities/wafer-scan.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { lineLabel } from "#app/lib/wafer-label.ts";
import type { WaitingDetail, WaitingRow } from "#app/schemas/waiting.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { scanPrograms } from "../scans.server.ts";
import { idFrom } from "../uuid.server.ts";
import { labelled } from "./wafer-of.ts";
import { waitingIds } from "./waiting-partner.server.ts";

export const WAITING_SORTS = ["since", "wafer", "file", "side", "program", "person"] as const;

/** Ages that the queue can be narrowed to, by the value in the address, in days. */
const OLDER_THAN: Record<string, number> = { day: 1, week: 7, month: 30 };
const DAY = 24 * 3600 * 1000;

function orderOf({ sort, descending }: ListParams) {
  const direction = descending ? "desc" : "asc";
  switch (sort) {
    case "wafer":
      return { wafer: { name: direction } };
    case "file":
      return { reading: { file: { name: direction } } };
    case "side":
      return { side: direction };
    case "program":
      return { program: { name: direction } };
    case "person":
      return { createdBy: { name: direction } };
    default:
      return { createdAt: direction };
  }
}

const POPULATED = ["program", "wafer.lot", "reading.file", "createdBy"] as const;

/** A page of the files that wait for their partner. Searched by wafer, lot, file, instrument and person. */
export async function listWaiting(scope: ActorScope, params: ListParams): Promise<ListPage<WaitingRow>> {
  scanPrograms(scope, "see the work");
  const pattern = { $ilike: `%${escapeLike(params.query)}%` };
  const days = OLDER_THAN[params.filters["older"] ?? ""];
  return inScope(scope, async (em) => {
    const { $in: programs } = programFilter(scope.actor, "see the work", params.filters["program"]);
    const [found, total] = await em.findAndCount(
      WaferScan,
      {
        id: { $in: await waitingIds(em, programs) },
        ...(days === undefined ? {} : { createdAt: { $lt: new Date(Date.now() - days * DAY) } }),
        ...(params.query
          ? {
              $or: [
                { wafer: { name: pattern } },
                { wafer: { lot: { name: pattern } } },
                { reading: { file: { name: pattern } } },
                { instrumentName: pattern },
                { createdBy: { name: pattern } },
              ],
            }
          : {}),
      },
      {
        populate: POPULATED,
        orderBy: [orderOf(params), { id: "asc" }] as never,
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    return { rows: found.map((each) => rowOf(each as Loaded)), total, params };
  });
}

/** How many files wait in the person's programs. */
export async function countWaiting(scope: ActorScope): Promise<number> {
  const programs = scanPrograms(scope, "see the work").map(({ programId }) => programId);
  return inScope(scope, async (em) => (await waitingIds(em, programs)).length);
}

type Loaded = WaferScan & {
  program: { id: string; name: string };
  reading: { file: { id: string; name: string } };
  createdBy: { name: string };
};

function rowOf(placed: Loaded): WaitingRow {
  const { id, wafer, azimuth, side, reading, program } = placed;
  return {
    id,
    wafer: { id: wafer.id, ...labelled(wafer) },
    azimuth,
    label: lineLabel(labelled(wafer), azimuth),
    side,
    file: { id: reading.file.id, name: reading.file.name },
    program: { id: program.id, name: program.name },
    instrumentName: placed.instrumentName,
    measuredAt: placed.measuredAt?.toISOString() ?? null,
    createdAt: placed.createdAt.toISOString(),
    createdBy: placed.createdBy.name,
  };
}

/**
 * A file that waits, with what was said of it and the files that may be its partner: those of the same wafer first.
 * @throws 404 for one that is not there, of another program, or that has its partner by now
 */
export async function getWaiting(scope: ActorScope, waferScanId: string | undefined): Promise<WaitingDetail> {
  const id = idFrom(waferScanId, "file that waits");
  return inScope(scope, async (em) => {
    const placed = (await em.findOne(WaferScan, { id }, { populate: POPULATED })) as Loaded | null;
    if (!placed) throw notFound("file that waits");
    requireInProgram(scope, "see the work", placed.program.id, "file that waits");
    const waiting = await waitingIds(em, [placed.program.id]);
    if (!waiting.includes(id)) throw notFound("file that waits");
    const others = await em.find(
      WaferScan,
      {
        id: { $in: waiting },
        side: placed.side === "before" ? "after" : "before",
        reading: { file: { $ne: placed.reading.file.id } },
      },
      { populate: POPULATED, orderBy: { createdAt: "desc" } },
    );
    const rows = others.map((each) => ({ ...rowOf(each as Loaded), subject: each.subject }));
    const own = placed.wafer.id;
    const partners = [...rows.filter(({ wafer }) => wafer.id === own), ...rows.filter(({ wafer }) => wafer.id !== own)];
    return { ...rowOf(placed), subject: placed.subject, partners };
  });
}
