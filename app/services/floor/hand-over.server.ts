import { randomUUID } from "node:crypto";
import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { HandOver } from "#app/db/entities/hand-over.ts";
import { mayInProgram, programsWhere } from "#app/policies/permissions.ts";
import type { GiveForm, HandOverLot, HandOverRow, HandOverView } from "#app/schemas/hand-over.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { everyWord } from "../like.server.ts";
import { requireInProgram, requireInSomeProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { lotStanding } from "./hand-over-lot.server.ts";
import { findFloorLot } from "./lot-sheet.server.ts";

const FLOOR = "work on the floor";
const POPULATE = { populate: ["program", "givenBy", "takenBy"] as const };

/** How many are listed; older ones are found by their place. */
const LISTED = 100;

/** The hand-overs of the programs on whose floor the person works, newest first. @param place words of a place's name */
export async function handOvers(scope: ActorScope, place: string): Promise<HandOverRow[]> {
  requireInSomeProgram(scope, FLOOR);
  return inScope(scope, async (em) => {
    const found = await em.find(
      HandOver,
      {
        program: { $in: programsWhere(scope.actor, FLOOR).map(({ programId }) => programId) },
        ...everyWord(place, (pattern) => ({ place: pattern })),
      },
      { ...POPULATE, orderBy: { givenAt: "desc", id: "asc" }, limit: LISTED },
    );
    const replaced = await replacedAmong(em, found);
    return found.map((each) => rowOf(scope, each, replaced));
  });
}

/** The same place has been handed over again since `h`. */
const GIVEN_ANEW = `exists (select 1 from hand_over later where later.program_id = h.program_id and later.place = h.place and later.given_at > h.given_at)`;

/** How many wait for this person to take them. */
export async function handOversToTake(scope: ActorScope): Promise<number> {
  requireInSomeProgram(scope, FLOOR);
  const programs = programsWhere(scope.actor, FLOOR).map(({ programId }) => programId);
  return inScope(scope, async (em) => (await waitingToBeTaken(em, scope.actor, programs)).length);
}

interface Waiting {
  id: string;
  place: string;
  program: string;
  by: string;
  lots: number;
  at: Date | string;
}

/** What waits for this person to take it in these programs, longest first. */
export async function waitingToBeTaken(
  em: EntityManager,
  actor: ActorScope["actor"],
  programs: readonly string[],
): Promise<Waiting[]> {
  if (programs.length === 0) return [];
  return em.execute<Waiting[]>(
    `select h.id, h.place, p.name as program, person.name as by, jsonb_array_length(h.lots) as lots, h.given_at as at
       from hand_over h join program p on p.id = h.program_id join person on person.id = h.given_by_id
      where h.program_id in (?) and h.taken_at is null and h.given_by_id <> ? and not ${GIVEN_ANEW}
      order by h.given_at, h.id`,
    [programs, actor.id],
  );
}

type Found = NonNullable<Awaited<ReturnType<typeof findHandOver>>>;

function findHandOver(em: EntityManager, id: string | undefined) {
  return em.findOne(HandOver, { id: idFrom(id, "hand-over") }, POPULATE);
}

function rowOf({ actor }: ActorScope, each: Found, replacedIds: ReadonlySet<string>): HandOverRow {
  const { id, program, place, lots, givenBy, givenAt, takenBy, takenAt } = each;
  return {
    id,
    program: program.name,
    place,
    lots: lots.length,
    by: givenBy.name,
    at: givenAt.toISOString(),
    taken: takenBy && takenAt ? { by: takenBy.name, at: takenAt.toISOString() } : null,
    replaced: takenAt === null && replacedIds.has(id),
    own: givenBy.id === actor.id,
  };
}

/** The ids of those whose place has been handed over again since. */
async function replacedAmong(em: EntityManager, found: readonly Found[]): Promise<ReadonlySet<string>> {
  if (found.length === 0) return new Set();
  const ids = found.map(({ id }) => id);
  const rows = await em.execute<{ id: string }[]>(`select h.id from hand_over h where h.id in (?) and ${GIVEN_ANEW}`, [
    ids,
  ]);
  return new Set(rows.map(({ id }) => id));
}

/** One hand-over as it was given, and which of its lots stand otherwise by now. @throws 404 for one that is not there or of another program */
export async function handOver(scope: ActorScope, id: string | undefined): Promise<HandOverView> {
  return inScope(scope, async (em) => {
    const found = await findHandOver(em, id);
    if (!found) throw notFound("hand-over");
    requireInProgram(scope, FLOOR, found.program.id, "hand-over");
    const row = rowOf(scope, found, await replacedAmong(em, [found]));
    const moved: string[] = [];
    // What is taken over belongs to the next shift; where its lots went then is theirs to hand over.
    if (row.taken === null) for (const lot of found.lots) if (await hasMoved(em, scope, lot)) moved.push(lot.name);
    return {
      ...row,
      remark: found.remark,
      takenRemark: found.takenRemark ?? "",
      content: found.lots,
      moved,
      mayTake: row.taken === null && !row.replaced && !row.own,
    };
  });
}

async function hasMoved(em: EntityManager, scope: ActorScope, was: HandOverLot): Promise<boolean> {
  const now = await lotStanding(em, scope, await findFloorLot(em, scope, was.id), new Date());
  // What was odd is of the hours before: it goes by itself, and what is new has come since.
  const told = new Set(was.odd);
  const said = (lot: Pick<HandOverLot, "sheet" | "at" | "blocks" | "wafers">) =>
    JSON.stringify([lot.sheet, lot.at, [...lot.blocks].sort(), lot.wafers.total, lot.wafers.inLine]);
  return said(now) !== said(was) || now.odd.some((each) => !told.has(each));
}

/**
 * Hands a place over: of each program one record of its lots there, as they stand now. Sent again, it counts once.
 * @throws 404 for a lot that is not there or of another program, 403 for a role that may not
 */
export async function giveOver(scope: ActorScope, { given, place, remark, lots }: GiveForm): Promise<void> {
  requireInSomeProgram(scope, FLOOR);
  await inScope(scope, async (em) => {
    // Of the same form sent twice at once the second waits, and then finds the first.
    await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`hand-over ${given}`]);
    if (await em.findOne(HandOver, { given })) return;
    const now = new Date();
    const programs = new Map<string, HandOverLot[]>();
    for (const { lot: id, on, remark: said } of lots) {
      if (id === undefined) continue;
      const lot = await findFloorLot(em, scope, id);
      const there = { ...(await lotStanding(em, scope, lot, now)), on, remark: said };
      programs.set(lot.program.id, [...(programs.get(lot.program.id) ?? []), there]);
    }
    for (const [program, content] of programs)
      em.create(HandOver, {
        id: randomUUID(),
        program,
        given,
        place,
        remark,
        lots: content,
        givenAt: now,
        givenBy: scope.actor.id,
        takenAt: null,
        takenBy: null,
        takenRemark: null,
      });
    await em.flush();
  });
}

/**
 * Takes a place over: whoever does answers for its lots from then on.
 * @returns what was given at the same time of another program and waits for this person too; null when nothing does
 * @throws 404 for one that is not there, 403 for one's own, 409 for one that was taken or given anew
 */
export async function takeOver(scope: ActorScope, id: string | undefined, remark: string): Promise<string | null> {
  return inScope(scope, async (em) => {
    const found = await findHandOver(em, id);
    if (!found || !mayInProgram(scope.actor, FLOOR, found.program.id)) throw notFound("hand-over");
    if (found.givenBy.id === scope.actor.id)
      throw problem(403, "You gave this hand-over. Somebody of the next shift takes it.");
    await em.lock(found, LockMode.PESSIMISTIC_WRITE);
    await em.refresh(found, POPULATE);
    if (found.takenAt) {
      // Sent again by whoever took it, it counts once.
      if (found.takenBy?.id === scope.actor.id) return alsoGiven(em, scope, found.given);
      throw problem(409, `${found.takenBy?.name ?? "Somebody"} has taken this over already. Ask them.`);
    }
    if ((await replacedAmong(em, [found])).has(found.id))
      throw problem(409, `${found.place} was handed over again since. Open the newest one, and take that.`);
    Object.assign(found, { takenAt: new Date(), takenBy: scope.actor.id, takenRemark: remark });
    await em.flush();
    return alsoGiven(em, scope, found.given);
  });
}

/** What else was given at once and waits for this person: a place has lots of several programs, each with a record of its own. */
async function alsoGiven(em: EntityManager, { actor }: ActorScope, given: string): Promise<string | null> {
  const programs = programsWhere(actor, FLOOR).map(({ programId }) => programId);
  const waiting = await waitingToBeTaken(em, actor, programs);
  const next = await em.findOne(
    HandOver,
    { given, id: { $in: waiting.map(({ id }) => id) } },
    { orderBy: { id: "asc" } },
  );
  return next?.id ?? null;
}
