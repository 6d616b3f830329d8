import { setImmediate } from "node:timers/promises";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Flow } from "#app/db/entities/flow.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { SITE_SUBJECTS, withChange } from "#app/lib/change-request.ts";
import { inputChanges } from "#app/lib/input-changes.ts";
import { movementOf } from "#app/lib/result-comparison.ts";
import type { AssessmentInput, Movement } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import {
  LIBRARY_SUBJECTS,
  type Change,
  type ChangeReach,
  type ChangeSubject,
  type LibrarySubject,
  type TouchedFlow,
} from "#app/schemas/change-request.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { flowInputOf } from "../flows/flow-inputs.ts";
import { requireInSomeProgram, requireOnSite } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { compute, type Computed } from "./compute.ts";
import { inputHash } from "./input-hash.server.ts";
import { presentFlows, type PresentFlow } from "./present-inputs.server.ts";

/** Flows computed for one question; beyond it the reader is asked to choose a program. */
const COMPUTED = 15;

const TABLES: Record<LibrarySubject, string> = {
  film: "film",
  carrier: "carrier",
  bondingMaterial: "bonding_material",
  equipment: "equipment",
};

/** Everything that a change can be about. */
export async function changeSubjects(scope: ActorScope): Promise<ChangeSubject[]> {
  requireOnSite(scope, "see the library");
  requireInSomeProgram(scope, "see the work");
  return inScope(scope, async (em) => {
    const subjects: ChangeSubject[] = [];
    for (const kind of LIBRARY_SUBJECTS) {
      const records = await em.execute<{ id: string; name: string }[]>(
        `select id, name from ${TABLES[kind]} order by lower(name)`,
      );
      subjects.push(...records.map(({ id, name }) => ({ kind, id, name })));
    }
    return [...subjects, ...SITE_SUBJECTS];
  });
}

/**
 * What a change would do to the flows of the person's programs, computed on everything as it is now.
 * @param programSlug only the flows of this program; undefined takes all
 */
export async function changeReach(
  scope: ActorScope,
  change: Change,
  programSlug: string | undefined,
): Promise<ChangeReach> {
  requireInSomeProgram(scope, "see the work");
  return inScope(scope, async (em) => {
    const program = programFilter(scope.actor, "see the work", programSlug);
    const flows = await em.find(
      Flow,
      { program },
      { fields: ["id"], orderBy: { program: { name: "asc" }, name: "asc" } },
    );
    const present = await presentFlows(
      em,
      scope,
      flows.map(({ id }) => id),
    );
    const candidates = flows.flatMap(({ id }) => {
      const now = present.get(id);
      const then = now && changedInput(now, change);
      return now && then ? [{ now, then }] : [];
    });
    const shown = candidates.slice(0, COMPUTED);
    const newest = await newestOf(
      em,
      shown.map(({ now }) => now.flow.id),
    );
    const touched: TouchedFlow[] = [];
    for (const { now, then } of shown) {
      // Others are served between two computations.
      await setImmediate();
      touched.push(touchedFlow(now, then, newest.get(now.flow.id) ?? null));
    }
    return {
      flows: flows.length,
      touched: touched.toSorted((a, b) => Number(moves(b)) - Number(moves(a))),
      more: candidates.length - shown.length,
    };
  });
}

/** Whether a flow would come out differently. */
function moves({ movement }: TouchedFlow): boolean {
  if (movement.outcome === "not computable") return true;
  return movement.moved.length > 0 || movement.before.outcome !== movement.after.outcome;
}

/** The input with the change made; null where it makes no difference to the flow. */
function changedInput({ flow, input }: PresentFlow, change: Change): AssessmentInput | null {
  const changed = withChange(flow, input.limits, change);
  if (!changed) return null;
  const then = { flow: flowInputOf(changed.flow), limits: changed.limits };
  return inputChanges(input, then).length === 0 ? null : then;
}

interface Newest {
  id: string;
  flow_id: string;
  number: number;
  outcome: AssessmentResult["verdict"]["outcome"];
  created_at: Date | string;
  input_hash: string;
  engine_version: string;
  result: AssessmentResult;
}

async function newestOf(em: EntityManager, flowIds: string[]): Promise<Map<string, Newest>> {
  if (flowIds.length === 0) return new Map();
  const rows = await em.execute<Newest[]>(
    `select distinct on (flow_id) id, flow_id, number, outcome, created_at, input_hash, engine_version, result
       from assessment where flow_id in (?) and lot is null order by flow_id, number desc`,
    [flowIds],
  );
  return new Map(rows.map((row) => [row.flow_id, row]));
}

function touchedFlow({ flow, input }: PresentFlow, then: AssessmentInput, newest: Newest | null): TouchedFlow {
  return {
    id: flow.id,
    name: flow.name,
    program: { name: flow.program.name, slug: flow.program.slug },
    newest: newest && {
      id: newest.id,
      number: newest.number,
      outcome: newest.outcome,
      createdAt: new Date(newest.created_at).toISOString(),
    },
    changes: inputChanges(input, then),
    movement: moved(beforeOf(input, newest), then),
  };
}

/** How the answer moves; or why one of the two cannot be computed. */
function moved(before: Computed, then: AssessmentInput): Movement {
  if (before.outcome === "not computable") return before;
  const after = compute(then);
  return after.outcome === "computed" ? movementOf(before.result, after.result) : after;
}

/** The answer as things are: the newest assessment's where that is still true. */
function beforeOf(input: AssessmentInput, newest: Newest | null): Computed {
  if (newest?.engine_version === ENGINE_VERSION && newest.input_hash === inputHash(input))
    return { outcome: "computed", result: newest.result };
  return compute(input);
}
