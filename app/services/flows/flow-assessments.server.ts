import { createHash } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { readLimits } from "../limits.server.ts";
import { flowInputOf, type FlowDetail } from "./flow-detail.ts";

/** An assessment of a flow as a line of its history. */
export interface FlowAssessmentRow {
  id: string;
  number: number;
  outcome: Outcome;
  sentences: string[];
  createdAt: string;
  createdBy: string;
  /** the flow, or something that it uses, has been changed since */
  outOfDate: boolean;
}

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
  const now = { flow: flowInputOf(flow), limits: await readLimits(em) };
  const hash = createHash("sha256").update(JSON.stringify(now)).digest("hex");
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
