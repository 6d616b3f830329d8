import type { EntityManager } from "@mikro-orm/postgresql";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { inputChanges } from "#app/lib/input-changes.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { inputHash } from "./input-hash.server.ts";
import { presentFlows } from "./present-inputs.server.ts";

interface Stored {
  engineVersion: string;
  inputHash: string;
  input: AssessmentInput;
}

/**
 * Whether an assessment would rest on something else now: another engine, or an input that differs. A fingerprint alone does not
 * tell: what a newer version of Planeward records besides, or the same value typed in other words, changes it too.
 */
export function isOutOfDate({ engineVersion, inputHash: hash, input }: Stored, present: AssessmentInput): boolean {
  if (engineVersion !== ENGINE_VERSION) return true;
  return hash !== inputHash(present) && inputChanges(input, present).length > 0;
}

interface SuspectRow {
  id: string;
  flow_id: string;
  engine_version: string;
  input_hash: string;
}

/**
 * Of these assessments, those that are out of date. Only those whose flow, or something that it uses, was saved since are looked
 * at closely, so a list pays for what has changed and not for its length. The minute's margin covers what was being saved while
 * the assessment ran.
 */
export async function outOfDateAmong(
  em: EntityManager,
  scope: ActorScope,
  assessmentIds: readonly string[],
): Promise<Set<string>> {
  if (assessmentIds.length === 0) return new Set();
  const rows = await em.execute<SuspectRow[]>(
    `select a.id, a.flow_id, a.engine_version, a.input_hash
       from assessment a
       join flow on flow.id = a.flow_id
       join silicon on silicon.id = flow.silicon_id
      where a.id in (?)
        and (a.engine_version <> ?
          or greatest(
               flow.updated_at,
               silicon.updated_at,
               (select max(updated_at) from site_limit),
               (select max(greatest(equipment.updated_at, carrier.updated_at, bonding_material.updated_at))
                  from flow_step step
                  left join equipment on equipment.id = step.equipment_id
                  left join carrier on carrier.id = step.carrier_id
                  left join bonding_material on bonding_material.id = step.bonding_material_id
                 where step.flow_id = flow.id),
               (select max(film.updated_at)
                  from flow_step step
                  join flow_step_film used on used.step_id = step.id
                  join film on film.id = used.film_id
                 where step.flow_id = flow.id)
             ) > a.created_at - interval '1 minute')`,
    [[...assessmentIds], ENGINE_VERSION],
  );
  const [suspects, others] = [
    rows.filter((row) => row.engine_version === ENGINE_VERSION),
    rows.filter((row) => row.engine_version !== ENGINE_VERSION),
  ];
  const stale = new Set(others.map(({ id }) => id));
  for (const id of await changedAmong(em, scope, suspects)) stale.add(id);
  return stale;
}

/** Of these assessments, those whose inputs differ now. */
async function changedAmong(em: EntityManager, scope: ActorScope, suspects: SuspectRow[]): Promise<string[]> {
  if (suspects.length === 0) return [];
  const present = await presentFlows(em, scope, [...new Set(suspects.map(({ flow_id }) => flow_id))]);
  const hashes = new Map([...present].map(([flowId, { input }]) => [flowId, inputHash(input)]));
  const differing = suspects.filter(({ flow_id, input_hash }) => hashes.get(flow_id) !== input_hash);
  if (differing.length === 0) return [];
  const inputs = await em.execute<{ id: string; flow_id: string; input: AssessmentInput }[]>(
    "select id, flow_id, input from assessment where id in (?)",
    [differing.map(({ id }) => id)],
  );
  return inputs
    .filter(({ flow_id, input }) => {
      const now = present.get(flow_id);
      return now !== undefined && inputChanges(input, now.input).length > 0;
    })
    .map(({ id }) => id);
}
