import type { Outcome } from "#app/engine/vocabulary.ts";
import { inputChanges } from "#app/lib/input-changes.ts";
import type { AssessmentName, ComparedAssessment, ComparisonOffer } from "#app/schemas/assessment-comparison.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { findAssessment } from "./assessments.server.ts";

const OFFERED = 50;
const LOTS_APART = "A lot stands beside the assessment that it is of on its own page, and is no revision to compare.";

interface Row {
  id: string;
  number: number;
  document_number: number;
  flow_id: string;
  flow_name: string;
  outcome: Outcome;
  created_at: Date | string;
}

const nameOf = (row: Row): AssessmentName => ({
  id: row.id,
  number: row.number,
  documentNumber: row.document_number,
  flow: { id: row.flow_id, name: row.flow_name },
  outcome: row.outcome,
  createdAt: new Date(row.created_at).toISOString(),
});

const COLUMNS = "id, number, document_number, flow_id, flow_name, outcome, created_at";

/**
 * An assessment beside another one of its program. `withId` null takes the revision before it, if there is one.
 * @param query what the name of another flow contains
 */
export async function comparisonOffer(
  scope: ActorScope,
  assessmentId: string | undefined,
  { withId, query }: { withId: string | null; query: string },
): Promise<ComparisonOffer> {
  return inScope(scope, async (em) => {
    const asked = await findAssessment(em, scope, assessmentId);
    if (asked.lot) throw problem(409, LOTS_APART);
    const sameFlow = await em.execute<Row[]>(
      `select ${COLUMNS} from assessment where flow_id = ? and id <> ? and lot is null order by number desc limit ${OFFERED}`,
      [asked.flow.id, asked.id],
    );
    const otherFlows = await em.execute<Row[]>(
      `select * from (
         select distinct on (flow_id) ${COLUMNS} from assessment
          where program_id = ? and flow_id <> ? and lot is null and flow_name ilike ?
          order by flow_id, number desc
       ) newest order by flow_name limit ${OFFERED}`,
      [asked.program.id, asked.flow.id, `%${escapeLike(query)}%`],
    );
    const otherId =
      (withId === asked.id ? null : withId) ?? sameFlow.find(({ number }) => number < asked.number)?.id ?? null;
    const other = otherId === null ? null : await findAssessment(em, scope, otherId);
    // What is compared has to be of one customer.
    if (other?.lot) throw problem(409, LOTS_APART);
    if (other && other.program.id !== asked.program.id) throw notFound("assessment");
    return {
      asked: headOf(asked),
      program: { name: asked.program.name, slug: asked.program.slug },
      sameFlow: sameFlow.map(nameOf),
      otherFlows: otherFlows.map(nameOf),
      chosen: other && compared(asked, other),
    };
  });
}

type Found = Awaited<ReturnType<typeof findAssessment>>;

const headOf = (assessment: Found): AssessmentName => ({
  id: assessment.id,
  number: assessment.number,
  documentNumber: assessment.documentNumber,
  flow: { id: assessment.flow.id, name: assessment.flowName },
  outcome: assessment.outcome,
  createdAt: assessment.createdAt.toISOString(),
});

const whole = (assessment: Found): ComparedAssessment => ({
  ...headOf(assessment),
  engineVersion: assessment.engineVersion,
  result: assessment.result,
});

function compared(asked: Found, other: Found): ComparisonOffer["chosen"] {
  const [before, after] = asked.createdAt < other.createdAt ? [asked, other] : [other, asked];
  const changes = inputChanges(before.input.$, after.input.$);
  return {
    before: whole(before),
    after: whole(after),
    // Two flows have two names, which is no input.
    changes: asked.flow.id === other.flow.id ? changes : changes.filter(({ subject }) => subject !== "Flow"),
  };
}
