import { raw, type QueryOrderMap } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { OUTCOMES } from "#app/engine/vocabulary.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import type { AssessmentRow } from "#app/schemas/assessment-row.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { outOfDateAmong } from "./out-of-date.server.ts";

export const ASSESSMENT_SORTS = ["run", "flow", "outcome"] as const;

/** What a list shows: results are long, and it needs nothing of them. */
const LISTED = [
  "id",
  "number",
  "documentNumber",
  "flowName",
  "outcome",
  "createdAt",
  "program.name",
  "program.slug",
  "createdBy.name",
] as const;

/** A page of the newest assessment of each flow that the person may see: those that a sheet would be printed from. Lots are none. */
export async function listNewestAssessments(scope: ActorScope, params: ListParams): Promise<ListPage<AssessmentRow>> {
  requireInSomeProgram(scope, "see the work");
  return inScope(scope, async (em) => {
    const newest = await em.execute<{ id: string }[]>(
      "select distinct on (flow_id) id from assessment where lot is null order by flow_id, number desc",
    );
    const outcome = OUTCOMES.find((word) => word === params.filters["outcome"]);
    const [assessments, total] = await em.findAndCount(
      Assessment,
      {
        id: { $in: newest.map(({ id }) => id) },
        program: programFilter(scope.actor, "see the work", params.filters["program"]),
        ...(outcome ? { outcome } : {}),
        ...(params.query ? { flowName: { $ilike: `%${escapeLike(params.query)}%` } } : {}),
      },
      {
        fields: [...LISTED],
        orderBy: [orderOf(params), { id: "asc" }],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const stale = await outOfDateAmong(
      em,
      scope,
      assessments.map(({ id }) => id),
    );
    const rows = assessments.map((assessment): AssessmentRow => ({
      id: assessment.id,
      number: assessment.number,
      documentNumber: assessment.documentNumber,
      flow: assessment.flowName,
      program: assessment.program.name,
      programSlug: assessment.program.slug,
      outcome: assessment.outcome,
      createdAt: assessment.createdAt.toISOString(),
      createdBy: assessment.createdBy.name,
      outOfDate: stale.has(assessment.id),
    }));
    return { rows, total, params };
  });
}

/** Newest first; outcomes by how bad they are, not by their letters. */
function orderOf({ sort, descending }: ListParams): QueryOrderMap<Assessment> {
  const direction = descending ? "desc" : "asc";
  if (sort === "flow") return { flowName: direction };
  if (sort !== "outcome") return { createdAt: descending ? "asc" : "desc" };
  const words = OUTCOMES.map((word) => `'${word}'`).join(", ");
  return { [raw((alias) => `array_position(array[${words}]::text[], ${alias}.outcome)`)]: direction };
}
