import type { EntityManager } from "@mikro-orm/postgresql";
import { LotHold } from "#app/db/entities/lot-hold.ts";
import { StepStop } from "#app/db/entities/step-stop.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { SHOWN } from "#app/lib/today-groups.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { TodayGroup, TodayLot, TodayLots } from "#app/schemas/today.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { mayClear } from "./blocks.server.ts";
import { waitingToBeTaken } from "./hand-over.server.ts";

const OPEN = { populate: ["lot", "program"] as const, orderBy: { openedAt: "asc" as const, id: "asc" as const } };

/**
 * Lots as Today needs them: what is held or stopped, longest first, which lots are on paper that is not in force any more, and which
 * places wait to be taken over.
 */
export async function lotsOfToday(em: EntityManager, { actor }: ActorScope): Promise<TodayLots> {
  const programs = (permission: Parameters<typeof programsWhere>[1]) =>
    programsWhere(actor, permission).map(({ programId }) => programId);
  const open = { program: { $in: programs("see the work") }, clearedAt: null };
  const holds = await em.find(LotHold, open, OPEN);
  const stops = await em.find(StepStop, open, OPEN);
  const blocks = [
    ...holds.map((hold) => ({ ...blockOf(hold), title: `Lot ${hold.lot.name} is held` })),
    ...stops.map((stop) => ({ ...blockOf(stop), title: `Step ${stop.step}, ${stop.title}, is stopped` })),
  ].toSorted((a, b) => a.at.localeCompare(b.at));
  return {
    blocked: { rows: blocks.slice(0, SHOWN), total: blocks.length },
    toMove: await onOldPaper(em, programs("assign sheets to lots")),
    toTake: await placesToTake(em, actor),
  };

  function blockOf({ id, lot, program, cause, reason, openedAt }: (typeof holds)[number] | (typeof stops)[number]) {
    return {
      id,
      path: `/lots/${lot.id}`,
      words: `${cause}: ${reason}`,
      program: program.name,
      at: openedAt.toISOString(),
      mine: mayClear(actor, program.id, cause),
    };
  }
}

/** For technicians and shift leads: others work on the floor now and then, and none of it waits for them. */
async function placesToTake(em: EntityManager, actor: ActorScope["actor"]): Promise<TodayGroup<TodayLot>> {
  const programs = programsWhere(actor, "work on the floor")
    .filter(({ role }) => role === "technician" || actor.siteRole === "shift lead")
    .map(({ programId }) => programId);
  const waiting = await waitingToBeTaken(em, actor, programs);
  return {
    total: waiting.length,
    rows: waiting.slice(0, SHOWN).map(({ id, place, program, by, lots, at }) => ({
      id,
      path: `/floor/hand-overs/${id}`,
      title: place,
      words: `${lots === 1 ? "1 lot" : `${lots} lots`}, given by ${by}.`,
      program,
      at: new Date(at).toISOString(),
      mine: true,
    })),
  };
}

interface PinnedRow {
  id: string;
  name: string;
  program: string;
  slug: string;
  sheet: number;
  number: number;
  state: "superseded" | "withdrawn";
  superseded_by: number | null;
  ended_at: Date | string;
}

/** Lots whose sheet was superseded or withdrawn since they were put on it. */
async function onOldPaper(em: EntityManager, programs: string[]): Promise<TodayGroup<TodayLot>> {
  if (programs.length === 0) return { rows: [], total: 0 };
  const rows = await em.execute<PinnedRow[]>(
    `select lot.id, lot.name, p.name as program, p.slug, s.number as sheet, r.number, r.state, r.superseded_by, r.ended_at
       from lot
       join program p on p.id = lot.program_id
       join lateral (
         select revision_id from lot_sheet where lot_sheet.lot_id = lot.id order by created_at desc, id desc limit 1
       ) pin on true
       join sheet_revision r on r.id = pin.revision_id and r.state <> 'released'
       join sheet s on s.id = r.sheet_id
      where lot.program_id in (?) order by r.ended_at, lot.id`,
    [programs],
  );
  return {
    total: rows.length,
    rows: rows.slice(0, SHOWN).map((row) => {
      const by = row.superseded_by === null ? "" : ` by ${revisionLetters(row.superseded_by)}`;
      return {
        id: row.id,
        path: `/lots/${row.id}`,
        title: `Lot ${row.name}`,
        words: `Sheet ${recordNumber("sheet", row.slug, row.sheet)} ${revisionLetters(row.number)} is ${row.state}${by}.`,
        program: row.program,
        at: new Date(row.ended_at).toISOString(),
        mine: true,
      };
    }),
  };
}
