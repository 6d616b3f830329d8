import type { EntityManager } from "@mikro-orm/postgresql";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { FlowAssessmentRow, FlowDetail } from "#app/schemas/flow-view.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { outOfDateAmong } from "../assessments/out-of-date.server.ts";

interface Row {
  id: string;
  number: number;
  outcome: Outcome;
  sentences: string[];
  created_at: Date;
  name: string;
}

const SHOWN = 20;

/**
 * The newest assessments of a flow, newest first, held against the flow as it is now. Only their sentences are read: the results
 * are a hundred times as long.
 */
export async function flowAssessments(
  em: EntityManager,
  scope: ActorScope,
  flow: FlowDetail,
): Promise<FlowAssessmentRow[]> {
  const rows = await em.execute<Row[]>(
    `select a.id, a.number, a.outcome, a.result -> 'sentences' as sentences, a.created_at, p.name
       from assessment a join person p on p.id = a.created_by_id
      where a.flow_id = ? and a.lot is null order by a.number desc limit ${SHOWN}`,
    [flow.id],
  );
  const stale = await outOfDateAmong(
    em,
    scope,
    rows.map(({ id }) => id),
  );
  return rows.map((row) => ({
    id: row.id,
    number: row.number,
    outcome: row.outcome,
    sentences: row.sentences,
    createdAt: new Date(row.created_at).toISOString(),
    createdBy: row.name,
    outOfDate: stale.has(row.id),
  }));
}
