import { setImmediate as othersTurn } from "node:timers/promises";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { MOST_COMPARED, readComparison, type ComparisonAsked } from "#app/lib/comparison/asked.ts";
import { letterOf } from "#app/lib/comparison/kinds.ts";
import type { ComparedFlow } from "#app/lib/flow-comparison/figures.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { ComparisonChoice } from "#app/schemas/comparison.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { outOfDateAmong } from "../assessments/out-of-date.server.ts";
import { presentFlows, type PresentFlow } from "../assessments/present-inputs.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { isUuid } from "../uuid.server.ts";
import { keptFlowAnswer } from "./kept-figures.server.ts";

/** Flows that were asked for, as far as they are there and the person's to see, in the order asked for. */
interface AskedFlows {
  asked: ComparisonAsked;
  missing: number;
  flows: (PresentFlow & { assessed: ComparedFlow["assessed"] })[];
}

/** Newest flows that are offered to be added. */
const OFFERED = 200;

const visiblePrograms = (scope: ActorScope) =>
  programsWhere(scope.actor, "see the work").map(({ programId }) => programId);

/** Reads what an address asks for; refused to who sees no work at all. */
export async function askedFlows(scope: ActorScope, search: URLSearchParams): Promise<AskedFlows> {
  requireInSomeProgram(scope, "see the work");
  const typed = readComparison(search);
  return inScope(scope, async (em) => {
    const found = await em.find(
      Flow,
      { id: { $in: typed.ids.filter(isUuid) }, program: { $in: visiblePrograms(scope) } },
      { fields: ["id"] },
    );
    const there = new Set(found.map(({ id }) => id));
    const ids = typed.ids.filter((id) => there.has(id));
    const present = await presentFlows(em, scope, ids);
    const assessed = await newestAssessments(em, scope, ids);
    return {
      asked: { ...typed, ids },
      missing: typed.ids.length - ids.length,
      flows: ids.flatMap((id) => {
        const flow = present.get(id);
        return flow ? [{ ...flow, assessed: assessed.get(id) ?? null }] : [];
      }),
    };
  });
}

/** The newest assessment of each flow, by the flow's id; lots are none. */
async function newestAssessments(
  em: EntityManager,
  scope: ActorScope,
  flowIds: readonly string[],
): Promise<Map<string, NonNullable<ComparedFlow["assessed"]>>> {
  const all = await em.find(
    Assessment,
    { flow: { $in: [...flowIds] }, lotNumber: 0 },
    { fields: ["id", "flow", "number", "createdAt"], orderBy: { number: "asc" } },
  );
  // Later ones overwrite earlier ones, so the newest of each flow is left.
  const newest = new Map(all.map((assessment) => [assessment.flow.id, assessment]));
  const stale = await outOfDateAmong(
    em,
    scope,
    [...newest.values()].map(({ id }) => id),
  );
  return new Map(
    [...newest].map(([flowId, { id, number, createdAt }]) => [
      flowId,
      {
        id,
        revision: `revision ${revisionLetters(number)}`,
        date: createdAt.toISOString().slice(0, 10),
        outOfDate: stale.has(id),
      },
    ]),
  );
}

/** The flows walked by the engine, others having their turn in between; more than a comparison holds are not. */
export async function walkedFlows(flows: AskedFlows["flows"]): Promise<ComparedFlow[]> {
  const walked: ComparedFlow[] = [];
  for (const [place, { flow, input, assessed }] of flows.slice(0, MOST_COMPARED).entries()) {
    const { id, name, program, silicon, stamp } = flow;
    walked.push({
      id,
      letter: letterOf(place),
      name,
      program: { name: program.name },
      changedAt: stamp.updatedAt,
      silicon: { name: silicon.name, diameter: silicon.diameter },
      assessed,
      ...keptFlowAnswer(input),
    });
    await othersTurn();
  }
  return walked;
}

/** Names of the flows that the person may compare, newest first. */
export async function flowChoices(scope: ActorScope): Promise<ComparisonChoice[]> {
  return inScope(scope, async (em) => {
    const flows = await em.find(
      Flow,
      { program: { $in: visiblePrograms(scope) } },
      { populate: ["program"], orderBy: { updatedAt: "desc" }, limit: OFFERED },
    );
    return flows.map(({ id, name, program }) => ({ id, name, program: program.name }));
  });
}
