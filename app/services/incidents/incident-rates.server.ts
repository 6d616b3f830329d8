import type { EntityManager } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { LIMIT_DEFINITIONS } from "#app/engine/rules/limits.ts";
import type { SupportClass } from "#app/engine/vocabulary.ts";
import { incidentRates, type StepPassed } from "#app/lib/incident-rates.ts";
import { limitEvidence } from "#app/lib/limit-evidence.ts";
import { lengthWords } from "#app/lib/stack-words.ts";
import { stepPrediction } from "#app/lib/step-prediction.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { IncidentRatesView } from "#app/schemas/incident-rates.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { readLimits } from "../limits.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";

/**
 * How often wafers break, by what the steps have in common, in the reader's programs or one of them.
 * @throws 403 for who sees no work
 */
export async function incidentRatesView(scope: ActorScope, program: string): Promise<IncidentRatesView> {
  requireInSomeProgram(scope, "see the work");
  const { $in: programs } = programFilter(scope.actor, "see the work", program);
  const { passed, limits } = await inScope(scope, async (em) => ({
    passed: programs.length > 0 ? await stepsPassed(em, programs) : [],
    limits: await readLimits(em),
  }));
  const rates = incidentRates(passed);
  return {
    rates,
    limits: limitEvidence(passed, limits, rates.all).map((evidence) => ({
      ...evidence,
      title: LIMIT_DEFINITIONS[evidence.key].title,
      value: lengthWords(evidence.limit),
    })),
    program,
    programs: programsWhere(scope.actor, "see the work").map(({ programSlug, programName }) => ({
      value: programSlug,
      label: programName,
    })),
  };
}

/** With the diameter of the wafer, m. */
type SizedStep = StepPassed & { diameter: number };

/** A lot at a step: what both counts have in common. */
interface Place {
  assessment_id: string;
  leg: number;
  step: number;
  lot_id: string;
}

interface Reported extends Place {
  diameter: number;
  step_kind: string;
  planned: SupportClass;
  silicon: number;
  films: string;
  incidents: number;
  affected: number;
  broken: number;
  through: number | null;
}

interface Done extends Place {
  counted: number | null;
  wafers: number;
}

const keyOf = ({ assessment_id, leg, step, lot_id }: Place) => `${assessment_id} ${leg} ${step} ${lot_id}`;

/**
 * Every lot at every step that the floor has entered as done, or at which something was reported. How many wafers went through is what the
 * report or the floor has counted, the larger of both; else the wafers of the lot, where the floor has done the step.
 */
async function stepsPassed(em: EntityManager, programs: string[]): Promise<SizedStep[]> {
  const reported = await em.execute<Reported[]>(
    `select assessment_id, leg, step, lot_id, min((a.result->'wafer'->>'diameter')::float8) as diameter, min(step_kind) as step_kind, min(planned) as planned, min(silicon) as silicon,
            min(films) as films, count(*)::int as incidents, sum(affected)::int as affected, sum(broken)::int as broken,
            max(through) as through
       from incident x join assessment a on a.id = x.assessment_id where x.program_id in (?) group by assessment_id, leg, step, lot_id`,
    [programs],
  );
  const done = await em.execute<Done[]>(
    `select r.assessment_id, e.leg, e.step, e.lot_id, max((e.content->>'count')::int) as counted,
            (select count(*)::int from wafer where wafer.lot_id = e.lot_id) as wafers
       from floor_entry e join sheet_revision r on r.id = e.revision_id
      where e.kind = 'done' and e.program_id in (?) group by r.assessment_id, e.leg, e.step, e.lot_id`,
    [programs],
  );
  const doneAt = new Map(done.map((each) => [keyOf(each), each]));
  const withReport = new Set(reported.map(keyOf));
  return [
    ...reported.map((each) => ({ ...each, through: throughOf(doneAt.get(keyOf(each)), each.through) })).map(ofReport),
    ...(await quietSteps(
      em,
      done.filter((each) => !withReport.has(keyOf(each))),
    )),
  ];
}

function throughOf(done: Done | undefined, stated: number | null): number | null {
  const counts = [stated, done?.counted ?? null].filter((count) => count !== null);
  if (counts.length > 0) return Math.max(...counts);
  return done && done.wafers > 0 ? done.wafers : null;
}

const ofReport = ({
  diameter,
  step_kind,
  planned,
  silicon,
  films,
  incidents,
  affected,
  broken,
  through,
}: Reported) => ({
  diameter,
  stepKind: step_kind,
  support: planned,
  silicon,
  films,
  through,
  incidents,
  affected,
  broken,
});

/** Steps that were done and of which nothing was reported, with what their assessment says of them. */
async function quietSteps(em: EntityManager, done: readonly Done[]): Promise<SizedStep[]> {
  const passed: SizedStep[] = [];
  // One assessment at a time: each is large, and most lots share a few.
  for (const id of new Set(done.map(({ assessment_id }) => assessment_id))) {
    const assessment = await em.findOneOrFail(Assessment, { id }, { populate: ["input"] });
    for (const each of done.filter(({ assessment_id }) => assessment_id === id)) {
      const said = stepPrediction(assessment.input.$, assessment.result, each.leg, each.step);
      if (!said) continue;
      const { stepKind, planned: support, silicon, films } = said;
      const through = throughOf(each, null);
      const { diameter } = assessment.result.wafer;
      passed.push({ diameter, stepKind, support, silicon, films, through, incidents: 0, affected: 0, broken: 0 });
    }
    em.clear();
  }
  return passed;
}
