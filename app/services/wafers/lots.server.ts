import type { EntityManager } from "@mikro-orm/postgresql";
import { Lot } from "#app/db/entities/lot.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { LotDetail, LotRow } from "#app/schemas/lot-view.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { wordPatterns } from "../like.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { scanPrograms } from "../scans.server.ts";
import { idFrom } from "../uuid.server.ts";
import { lotWafers } from "./lot-wafers.server.ts";

export const LOT_SORTS = ["created", "name", "program", "person"] as const;

function orderOf({ sort, descending }: ListParams) {
  const direction = descending ? "desc" : "asc";
  switch (sort) {
    case "name":
      return { name: direction };
    case "program":
      return { program: { name: direction } };
    case "person":
      return { createdBy: { name: direction } };
    default:
      return { createdAt: direction };
  }
}

/** A page of the lots of the person's programs. Searched by lot, by the names of its wafers, and by person. */
export async function listLots(scope: ActorScope, params: ListParams): Promise<ListPage<LotRow>> {
  scanPrograms(scope, "see the work");
  return inScope(scope, async (em) => {
    const [lots, total] = await em.findAndCount(
      Lot,
      {
        program: programFilter(scope.actor, "see the work", params.filters["program"]),
        $and: await Promise.all(wordPatterns(params.query).map((pattern) => namedAs(em, pattern))),
      },
      {
        populate: ["program", "createdBy"],
        orderBy: [orderOf(params), { id: "asc" }] as never,
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const counts = await countsOf(
      em,
      lots.map(({ id }) => id),
    );
    const rows = lots.map(({ id, name, program, createdAt, createdBy }) => ({
      id,
      name,
      program: program.name,
      wafers: counts.get(id)?.wafers ?? 0,
      lastAt: counts.get(id)?.lastAt?.toISOString() ?? null,
      createdAt: createdAt.toISOString(),
      createdBy: createdBy.name,
    }));
    return { rows, total, params };
  });
}

/** The condition that one word of a search is found of a lot. */
async function namedAs(em: EntityManager, pattern: string) {
  const name = { $ilike: pattern };
  return { $or: [{ name }, { createdBy: { name } }, { id: { $in: await lotsWithWafer(em, pattern) } }] };
}

async function lotsWithWafer(em: EntityManager, pattern: string): Promise<string[]> {
  const rows = await em.execute<{ id: string }[]>(
    "select distinct lot_id as id from wafer where lot_id is not null and name ilike ?",
    [pattern],
  );
  return rows.map(({ id }) => id);
}

/** How many wafers lots have, and when something last came in of one of them. */
async function countsOf(
  em: EntityManager,
  ids: string[],
): Promise<Map<string, { wafers: number; lastAt: Date | null }>> {
  if (ids.length === 0) return new Map();
  const rows = await em.execute<{ id: string; wafers: number; last_at: string | Date | null }[]>(
    `select w.lot_id as id, count(*)::int as wafers, max(greatest(
         (select max(created_at) from wafer_scan where wafer_id = w.id),
         (select max(created_at) from wafer_measurement where wafer_id = w.id))) as last_at
       from wafer w where w.lot_id in (${ids.map(() => "?").join(", ")}) group by w.lot_id`,
    ids,
  );
  return new Map(
    rows.map(({ id, wafers, last_at }) => [id, { wafers, lastAt: last_at === null ? null : new Date(last_at) }]),
  );
}

/**
 * A lot with its wafers by slot and the newest figures of each.
 * @throws 404 for a lot that is not there or of another program
 */
export async function getLot(scope: ActorScope, lotId: string | undefined): Promise<LotDetail> {
  return inScope(scope, async (em) => {
    const lot = await em.findOne(Lot, { id: idFrom(lotId, "lot") }, { populate: ["program", "createdBy"] });
    if (!lot) throw notFound("lot");
    requireInProgram(scope, "see the work", lot.program.id, "lot");
    return {
      id: lot.id,
      name: lot.name,
      note: lot.note,
      program: { id: lot.program.id, name: lot.program.name, diameter: lot.program.diameter },
      createdAt: lot.createdAt.toISOString(),
      createdBy: lot.createdBy.name,
      ...(await lotWafers(em, lot.id)),
      mayUpload: mayInProgram(scope.actor, "upload scans", lot.program.id),
    };
  });
}

/** Whether a lot is there for this person. */
export async function isLot(scope: ActorScope, lotId: string): Promise<boolean> {
  return inScope(scope, async (em) => (await em.count(Lot, { id: idFrom(lotId, "lot") })) > 0);
}

const LONGEST_NOTE = 500;

/**
 * Writes what there is to say of a lot.
 * @throws 404 for a lot that is not there or of another program, 403 for a role that may not, 400 for a note that is too long
 */
export async function noteLot(scope: ActorScope, lotId: string | undefined, note: string): Promise<void> {
  const text = note.replaceAll("\r\n", "\n").trim();
  await inScope(scope, async (em) => {
    const lot = await em.findOne(Lot, { id: idFrom(lotId, "lot") });
    if (!lot) throw notFound("lot");
    requireInProgram(scope, "upload scans", lot.program.id, "lot");
    if (text.length > LONGEST_NOTE)
      throw problem(400, `A note of a lot has up to ${LONGEST_NOTE} characters. Go back and shorten it.`);
    lot.note = text;
    await em.flush();
  });
}
