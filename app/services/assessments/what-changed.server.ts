import type { EntityManager } from "@mikro-orm/postgresql";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { inputChanges } from "#app/lib/input-changes.ts";
import { movementOf } from "#app/lib/result-comparison.ts";
import type { DatedChange, InputChange, OutOfDate } from "#app/schemas/assessment-changes.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "./assessments.server.ts";
import { compute } from "./compute.ts";
import { KEPT_KINDS, KEPT_RECORDS } from "./kept-records.ts";
import { presentFlow } from "./present-inputs.server.ts";

/**
 * What has changed since an assessment was run, and how far the answer moves; null when nothing has. The engine runs on the inputs
 * as they are now, and nothing of it is stored.
 */
export async function whatChanged(scope: ActorScope, assessmentId: string): Promise<OutOfDate | null> {
  return inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, assessmentId);
    const { flow, input } = await presentFlow(em, scope, assessment.flow.id);
    const changes = inputChanges(assessment.input.$, input);
    const engine =
      assessment.engineVersion === ENGINE_VERSION ? null : { from: assessment.engineVersion, to: ENGINE_VERSION };
    if (changes.length === 0 && engine === null) return null;
    const computed = compute(input);
    return {
      engine,
      changes: await dated(em, changes, flow.stamp, assessment.createdAt),
      movement: computed.outcome === "computed" ? movementOf(assessment.result, computed.result) : computed,
    };
  });
}

interface Saved {
  key: string;
  updated_at: Date | string;
  name: string | null;
}

/** The changes with who saved their records last, where that was since. */
async function dated(
  em: EntityManager,
  changes: readonly InputChange[],
  flow: RecordStamp,
  since: Date,
): Promise<DatedChange[]> {
  const stamps = new Map<string, { at: string; by: string | null }>();
  stamps.set(keyOf({ kind: "flow", id: null }), { at: flow.updatedAt, by: flow.updatedBy });
  for (const kind of KEPT_KINDS) {
    const keys = changes.flatMap(({ record }) => (record.kind === kind && record.id !== null ? [record.id] : []));
    if (keys.length === 0) continue;
    const [table, column] = KEPT_RECORDS[kind];
    const rows = await em.execute<Saved[]>(
      `select record.${column}::text as key, record.updated_at, person.name
         from ${table} record left join person on person.id = record.updated_by_id where record.${column}::text in (?)`,
      [keys],
    );
    for (const { key, updated_at, name } of rows)
      stamps.set(keyOf({ kind, id: key }), { at: new Date(updated_at).toISOString(), by: name });
  }
  return changes.map((change) => {
    const stamp = stamps.get(keyOf(change.record));
    return stamp && new Date(stamp.at) >= since ? { ...change, ...stamp } : { ...change, by: null, at: null };
  });
}

const keyOf = ({ kind, id }: InputChange["record"]) => `${kind} ${id ?? ""}`;
