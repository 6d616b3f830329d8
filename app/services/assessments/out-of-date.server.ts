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
  saved: Date | string;
  versions: string;
}

/**
 * Of these assessments, those that are out of date. Only those whose flow, or something that it uses, was saved since are looked
 * at closely, and each only once for every save: a list pays for what has changed and not for its length. The margin covers what
 * was being saved while the assessment ran.
 */
export async function outOfDateAmong(
  em: EntityManager,
  scope: ActorScope,
  assessmentIds: readonly string[],
): Promise<Set<string>> {
  if (assessmentIds.length === 0) return new Set();
  const rows = await em.execute<SuspectRow[]>(
    `select * from (
       select a.id, a.flow_id, a.engine_version, a.input_hash, a.created_at,
              greatest(flow.updated_at, silicon.updated_at, limits.saved, tools.saved, films.saved) as saved,
              concat_ws(' ', flow.version, silicon.version, limits.versions, tools.versions, films.versions) as versions
         from assessment a
         join flow on flow.id = a.flow_id
         join silicon on silicon.id = flow.silicon_id
        cross join (select max(updated_at) as saved, sum(version) as versions from site_limit) limits
        cross join lateral (
          select max(greatest(equipment.updated_at, carrier.updated_at, bonding_material.updated_at, tape.updated_at)) as saved,
                 sum(coalesce(equipment.version, 0) + coalesce(carrier.version, 0)
                   + coalesce(bonding_material.version, 0) + coalesce(tape.version, 0)) as versions
            from flow_step step
            left join equipment on equipment.id = step.equipment_id
            left join carrier on carrier.id = step.carrier_id
            left join bonding_material on bonding_material.id = step.bonding_material_id
            left join tape on tape.id = step.tape_id
           where step.flow_id = flow.id) tools
        cross join lateral (
          select max(film.updated_at) as saved, sum(film.version) as versions
            from flow_step step
            join flow_step_film used on used.step_id = step.id
            join film on film.id = used.film_id
           where step.flow_id = flow.id) films
        where a.id in (?)
     ) looked_at
     where engine_version <> ? or saved > created_at - interval '10 seconds'`,
    [[...assessmentIds], ENGINE_VERSION],
  );
  const stale = new Set(rows.filter((row) => row.engine_version !== ENGINE_VERSION).map(({ id }) => id));
  const suspects = rows.filter((row) => row.engine_version === ENGINE_VERSION);
  const unknown = suspects.filter((row) => !judged.has(stateOf(row)));
  const changed = new Set(await changedAmong(em, scope, unknown));
  for (const row of unknown) remember(stateOf(row), changed.has(row.id));
  for (const row of suspects) if (judged.get(stateOf(row))) stale.add(row.id);
  return stale;
}

/** Whether an assessment is out of date, by itself and by the saves of everything that it rests on: those decide it for good. */
const judged = new Map<string, boolean>();
const REMEMBERED = 5000;

const stateOf = ({ id, saved, versions }: SuspectRow) => `${id} ${new Date(saved).getTime()} ${versions}`;

function remember(state: string, outOfDate: boolean): void {
  const [oldest] = judged.keys();
  if (judged.size >= REMEMBERED && oldest !== undefined) judged.delete(oldest);
  judged.set(state, outOfDate);
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
