import type { EntityManager } from "@mikro-orm/postgresql";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { FlowAssessmentRow, FlowDetail } from "#app/schemas/flow-view.ts";
import { inputHash } from "../assessments/input-hash.server.ts";
import { readLimits } from "../limits.server.ts";
import { flowInputOf } from "./flow-inputs.ts";

interface Row {
  id: string;
  number: number;
  outcome: Outcome;
  sentences: string[];
  created_at: Date;
  input_hash: string;
  name: string;
}

const SHOWN = 20;

/**
 * The newest assessments of a flow, newest first, held against the flow as it is now. Only their sentences are read: the results
 * are a hundred times as long.
 */
export async function flowAssessments(em: EntityManager, flow: FlowDetail): Promise<FlowAssessmentRow[]> {
  const rows = await em.execute<Row[]>(
    `select a.id, a.number, a.outcome, a.result -> 'sentences' as sentences, a.created_at, a.input_hash, p.name
       from assessment a join person p on p.id = a.created_by_id
      where a.flow_id = ? order by a.number desc limit ${SHOWN}`,
    [flow.id],
  );
  if (rows.length === 0) return [];
  const hash = inputHash({ flow: flowInputOf(flow), limits: await readLimits(em) });
  return rows.map((row) => ({
    id: row.id,
    number: row.number,
    outcome: row.outcome,
    sentences: row.sentences,
    createdAt: new Date(row.created_at).toISOString(),
    createdBy: row.name,
    outOfDate: row.input_hash !== hash,
  }));
}
