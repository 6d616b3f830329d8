import type { EntityManager } from "@mikro-orm/postgresql";
import { Program } from "#app/db/entities/program.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { groupFlows } from "#app/lib/today-groups.ts";
import { mayInProgram, mayOnSite, programsWhere } from "#app/policies/permissions.ts";
import type { AssessmentResult, StepResult } from "#app/schemas/assessment-result.ts";
import type { TodayAssessed, TodayFlow, TodayGroup, TodayProgram, TodayView } from "#app/schemas/today.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { outOfDateAmong } from "./assessments/out-of-date.server.ts";
import { demoIsHere, demoPrograms } from "./demo/demo-view.server.ts";
import { lotsOfToday } from "./floor/today-lots.server.ts";
import { incidentsOfToday } from "./incidents/today-incidents.server.ts";
import { keptGroups } from "./kept/kept-rows.server.ts";
import { latestScans } from "./scans.server.ts";
import { sheetsOfToday } from "./sheets/today-sheets.server.ts";

const LATEST_SCANS = 4;

const nothing = { rows: [], total: 0 };

/** What waits in the programs that the person belongs to; one transaction, the same few queries however many flows there are. */
export async function todayView(scope: ActorScope): Promise<TodayView> {
  const { actor } = scope;
  const works = programsWhere(actor, "see the work").map(({ programId }) => programId);
  return inScope(scope, async (em): Promise<TodayView> => {
    const programs = await em.find(
      Program,
      { id: { $in: actor.memberships.map(({ programId }) => programId) } },
      { orderBy: { name: "asc" } },
    );
    const view = {
      now: new Date().toISOString(),
      works: works.length > 0,
      mayAssess: programsWhere(actor, "run assessments").length > 0,
      mayUpload: programsWhere(actor, "upload scans").length > 0,
      demo: mayOnSite(actor, "load and remove the demo") ? await demoOf(em) : null,
      kept: await keptGroups(em, scope),
      sheets: await sheetsOfToday(em, scope),
      incidents: works.length === 0 ? nothing : await incidentsOfToday(em, scope),
      lots: works.length === 0 ? { blocked: nothing, toMove: nothing, toTake: nothing } : await lotsOfToday(em, scope),
    };
    if (works.length === 0)
      return {
        ...view,
        decisions: nothing,
        outOfDate: nothing,
        notAssessed: nothing,
        scans: [],
        programs: programs.map((program) => programRow(program, 0, 0)),
      };
    const flows = await flowsOf(em, scope, works);
    const stacks = await stackCounts(em, works);
    const stale = await outOfDateAmong(
      em,
      scope,
      flows.flatMap(({ flow }) => flow.newest?.id ?? []),
    );
    const { decisions, outOfDate, notAssessed } = groupFlows(
      flows.map(({ flow }) => flow),
      stale,
    );
    const details = await detailsOf(
      em,
      [...decisions.rows, ...outOfDate.rows].map(({ newest }) => newest.id),
    );
    return {
      ...view,
      decisions: withDetails(decisions, details),
      outOfDate: withDetails(outOfDate, details),
      notAssessed,
      scans: await latestScans(em, works, LATEST_SCANS),
      programs: programs.map((program) =>
        programRow(
          program,
          flows.filter(({ programId }) => programId === program.id).length,
          stacks.get(program.id) ?? 0,
        ),
      ),
    };
  });
}

async function demoOf(em: EntityManager): Promise<TodayView["demo"]> {
  return { here: await demoIsHere(em), programs: (await demoPrograms(em)).map(({ name }) => name) };
}

function programRow(
  { id, name, slug, diameter, purpose }: Omit<TodayProgram, "flows" | "stacks">,
  flows: number,
  stacks: number,
): TodayProgram {
  return { id, name, slug, diameter, purpose, flows, stacks };
}

interface FlowRow {
  id: string;
  name: string;
  program_id: string;
  program: string;
  updated_at: Date | string;
  newest_id: string | null;
  number: number;
  outcome: Outcome;
  created_at: Date | string;
}

/** Every flow of the programs with its newest assessment, found through the index of flow and number. */
async function flowsOf(
  em: EntityManager,
  { actor }: ActorScope,
  programs: string[],
): Promise<{ programId: string; flow: TodayFlow }[]> {
  const rows = await em.execute<FlowRow[]>(
    `select flow.id, flow.name, flow.program_id, program.name as program, flow.updated_at,
            newest.id as newest_id, newest.number, newest.outcome, newest.created_at
     from flow
     join program on program.id = flow.program_id
     left join lateral (
       select id, number, outcome, created_at from assessment
       where assessment.flow_id = flow.id and lot is null order by number desc limit 1
     ) newest on true
     where flow.program_id in (?)`,
    [programs],
  );
  return rows.map((row) => ({
    programId: row.program_id,
    flow: {
      id: row.id,
      name: row.name,
      program: row.program,
      updatedAt: isoOf(row.updated_at),
      mayAssess: mayInProgram(actor, "run assessments", row.program_id),
      newest:
        row.newest_id === null
          ? null
          : { id: row.newest_id, number: row.number, outcome: row.outcome, at: isoOf(row.created_at) },
    },
  }));
}

const isoOf = (time: Date | string) => new Date(time).toISOString();

async function stackCounts(em: EntityManager, programs: string[]): Promise<Map<string, number>> {
  const rows = await em.execute<{ program_id: string; stacks: number }[]>(
    "select program_id, count(*)::int as stacks from stack where program_id in (?) group by program_id",
    [programs],
  );
  return new Map(rows.map(({ program_id, stacks }) => [program_id, stacks]));
}

type Detail = Pick<TodayAssessed, "sentence" | "diameter" | "wafer">;

interface DetailRow {
  id: string;
  sentences: AssessmentResult["sentences"];
  diameter: number;
  step: StepResult | null;
}

/** What decides each assessment: its last sentence and the step that the verdict names, without the rest of the result. */
async function detailsOf(em: EntityManager, ids: string[]): Promise<Map<string, Detail>> {
  if (ids.length === 0) return new Map();
  const rows = await em.execute<DetailRow[]>(
    `select id, result->'sentences' as sentences, (result->'wafer'->>'diameter')::double precision as diameter,
            result->'steps'->((result->'verdict'->>'step')::int - 1) as step
     from assessment where id in (?)`,
    [ids],
  );
  return new Map(
    rows.map(({ id, sentences, diameter, step }) => [
      id,
      {
        sentence: sentences.at(-1) ?? "",
        diameter,
        wafer: step && { shape: step.atRoom, faceUp: step.faceUp, holding: step.planned },
      },
    ]),
  );
}

function withDetails(
  { rows, total }: TodayGroup<TodayFlow & Pick<TodayAssessed, "newest">>,
  details: Map<string, Detail>,
): TodayGroup<TodayAssessed> {
  return {
    total,
    rows: rows.map((row) => ({
      ...row,
      ...(details.get(row.newest.id) ?? { sentence: "", diameter: 0, wafer: null }),
    })),
  };
}
