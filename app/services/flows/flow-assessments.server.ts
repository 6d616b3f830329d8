import type { EntityManager } from "@mikro-orm/postgresql";
import type { Outcome } from "#app/engine/vocabulary.ts";

/** An assessment of a flow as a line of its history. */
export interface FlowAssessmentRow {
  id: string;
  number: number;
  outcome: Outcome;
  sentences: string[];
  createdAt: string;
  createdBy: string;
}

const SHOWN = 20;

/** The newest assessments of a flow, newest first. Only their sentences are read: the results are a hundred times as long. */
export async function flowAssessments(em: EntityManager, flowId: string): Promise<FlowAssessmentRow[]> {
  const rows = await em.execute<
    { id: string; number: number; outcome: Outcome; sentences: string[]; created_at: Date; name: string }[]
  >(
    `select a.id, a.number, a.outcome, a.result -> 'sentences' as sentences, a.created_at, p.name
       from assessment a join person p on p.id = a.created_by_id
      where a.flow_id = ? order by a.number desc limit ${SHOWN}`,
    [flowId],
  );
  return rows.map(({ id, number, outcome, sentences, created_at: createdAt, name }) => ({
    id,
    number,
    outcome,
    sentences,
    createdAt: new Date(createdAt).toISOString(),
    createdBy: name,
  }));
}
