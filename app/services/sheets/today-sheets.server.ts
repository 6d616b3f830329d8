import type { EntityManager } from "@mikro-orm/postgresql";
import { Deviation } from "#app/db/entities/deviation.ts";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { SHOWN } from "#app/lib/today-groups.ts";
import { inPlaceOf, programsWhere } from "#app/policies/permissions.ts";
import type { RevisionState } from "#app/schemas/sheet-revision.ts";
import type { TodayGroup, TodaySheet, TodaySheets } from "#app/schemas/today.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

const RELEASE = "release, return and withdraw sheets";

/** For how long a change of what is in force is news, and how long before its end a deviation is to be seen to, days. */
const NEWS = 14;
const SOON = 7;
const DAY = 24 * 3600e3;

const NONE: TodayGroup<TodaySheet> = { rows: [], total: 0 };

/** Sheets as Today needs them: what waits for this person, what they wait for, what is about to lapse and what has changed lately. */
export async function sheetsOfToday(em: EntityManager, { actor }: ActorScope): Promise<TodaySheets> {
  const programs = (permission: Parameters<typeof programsWhere>[1]) =>
    programsWhere(actor, permission).map(({ programId }) => programId);
  const [releases, asks, deviates, sees] = [
    programs(RELEASE),
    programs("ask for a review"),
    programs("record deviations"),
    programs("see released sheets"),
  ];
  const me = actor.id;
  // In each program, whose work is not for this person to release: their own, and that of whom they stand in for there.
  const notTheirs = releases.map((program) => ({
    program,
    hands: [me, ...inPlaceOf(actor, RELEASE, program).map(({ id: owner }) => owner)],
  }));
  const revisions = async (among: string[], where: object, descending = false): Promise<TodayGroup<TodaySheet>> => {
    if (among.length === 0) return NONE;
    const [rows, total] = await em.findAndCount(
      SheetRevision,
      { program: { $in: among }, ...where },
      {
        populate: ["sheet", "program"],
        orderBy: [descending ? { decidedAt: "desc" } : { askedAt: "asc" }, { id: "asc" }],
        limit: SHOWN,
      },
    );
    return { rows: rows.map((row) => sheetOf(row)), total };
  };
  const inForce: RevisionState = "released";
  const lately = new Date(Date.now() - NEWS * DAY);
  return {
    toRelease: await revisions(releases, {
      state: "in review",
      $or: notTheirs.map(({ program, hands }) => ({
        program,
        askedBy: { $nin: hands },
        assessment: { createdBy: { $nin: hands } },
      })),
    }),
    asked: await revisions(asks, { state: "in review", askedBy: me }),
    returned: await returnedTo(em, me, asks),
    toSign: await deviations(em, releases, {
      signedAt: null,
      until: { $gt: new Date() },
      $or: notTheirs.map(({ program, hands }) => ({ program, createdBy: { $nin: hands } })),
      revision: { state: "in review" },
    }),
    lapsing: await deviations(em, deviates, {
      signedAt: { $ne: null },
      until: { $lt: new Date(Date.now() + SOON * DAY) },
      revision: { state: inForce },
    }),
    lately: await revisions(
      sees,
      {
        $or: [
          { state: inForce, decidedAt: { $gte: lately } },
          { state: "withdrawn", endedAt: { $gte: lately } },
        ],
      },
      true,
    ),
    inForce: await em.count(SheetRevision, { state: inForce, program: { $in: sees } }),
  };
}

type Loaded = Pick<
  SheetRevision,
  "id" | "title" | "state" | "number" | "askedAt" | "decidedAt" | "endedAt" | "reason" | "endReason" | "note"
> & {
  assessment: { id: string };
  sheet: { number: number };
  program: { slug: string; name: string };
};

function sheetOf(revision: Loaded, words?: string): TodaySheet {
  const { id, assessment, sheet, program, number, state, title, askedAt, decidedAt, endedAt } = revision;
  const said = state === "in review" ? revision.note : state === "withdrawn" ? revision.endReason : revision.reason;
  return {
    id,
    revisionId: id,
    assessmentId: assessment.id,
    name: `${recordNumber("sheet", program.slug, sheet.number)}${number ? ` ${revisionLetters(number)}` : ""}`,
    released: number !== null && number !== undefined,
    state,
    title,
    program: program.name,
    at: (endedAt ?? decidedAt ?? askedAt).toISOString(),
    words: words ?? said ?? "",
  };
}

/** What was returned to the person and has not been asked for again since. */
async function returnedTo(em: EntityManager, me: string, programs: string[]): Promise<TodayGroup<TodaySheet>> {
  if (programs.length === 0) return NONE;
  const open = await em.execute<{ id: string }[]>(
    `select id from sheet_revision returned
     where state = 'returned' and asked_by_id = ? and decided_by_id <> asked_by_id and program_id in (?)
       and not exists (
         select from sheet_revision later where later.sheet_id = returned.sheet_id and later.asked_at > returned.asked_at
       )
     order by decided_at`,
    [me, programs],
  );
  const rows = await em.find(
    SheetRevision,
    { id: { $in: open.slice(0, SHOWN).map(({ id }) => id) } },
    { populate: ["sheet", "program"], orderBy: { decidedAt: "asc" } },
  );
  return { rows: rows.map((row) => sheetOf(row)), total: open.length };
}

/** Deviations by their end, each as the revision that it is for. */
async function deviations(em: EntityManager, among: string[], where: object): Promise<TodayGroup<TodaySheet>> {
  if (among.length === 0) return NONE;
  const [rows, total] = await em.findAndCount(
    Deviation,
    { program: { $in: among }, ...where },
    {
      populate: ["revision.sheet", "revision.program"],
      orderBy: { until: "asc", id: "asc" },
      limit: SHOWN,
    },
  );
  return {
    rows: rows.map((row) => ({
      ...sheetOf(row.revision, row.scope),
      id: row.id,
      revisionId: row.revision.id,
      at: row.until.toISOString(),
    })),
    total,
  };
}
