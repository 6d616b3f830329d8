import { Assessment } from "#app/db/entities/assessment.ts";
import { FlowStep } from "#app/db/entities/flow-step.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import type { FlowDetail, FlowRow } from "#app/schemas/flow-view.ts";
import type { FlowValues } from "#app/schemas/flow.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { favouriteIds } from "../kept/favourites.server.ts";
import { everyWord } from "../like.server.ts";
import { requireInProgram, requireInSomeProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { idFrom } from "../uuid.server.ts";
import { changePlan, type FlowSaved } from "./change-flow.server.ts";
import { findFlow, readFlow } from "./read-flow.server.ts";

export const FLOW_SORTS = ["updated", "name", "program", "diameter"] as const;

/** A page of the flows that the person may see, each with its newest assessment. */
export async function listFlows(scope: ActorScope, params: ListParams): Promise<ListPage<FlowRow>> {
  requireInSomeProgram(scope, "see the work");
  return inScope(scope, async (em) => {
    const direction = params.descending ? "desc" : "asc";
    const [flows, total] = await em.findAndCount(
      Flow,
      {
        program: programFilter(scope.actor, "see the work", params.filters["program"]),
        ...(params.filters["favourites"] ? { id: { $in: await favouriteIds(em, scope, "flow") } } : {}),
        ...(params.query ? everyWord(params.query, (name) => ({ name })) : {}),
      },
      {
        populate: ["program", "silicon"],
        orderBy: [
          params.sort === "name"
            ? { name: direction }
            : params.sort === "program"
              ? { program: { name: direction } }
              : params.sort === "diameter"
                ? { silicon: { diameter: direction } }
                : { updatedAt: direction },
          { id: "asc" },
        ],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const ids = flows.map(({ id }) => id);
    const steps = await em.find(FlowStep, { flow: { $in: ids } }, { fields: ["id", "flow"] });
    const assessments = await em.find(
      Assessment,
      { flow: { $in: ids }, lotNumber: 0 },
      { fields: ["id", "flow", "number", "outcome", "createdAt"], orderBy: { number: "asc" } },
    );
    // Later ones overwrite earlier ones, so the newest of each flow is left.
    const latest = new Map(assessments.map((assessment) => [assessment.flow.id, assessment]));
    const rows = flows.map((flow): FlowRow => {
      const newest = latest.get(flow.id);
      return {
        id: flow.id,
        name: flow.name,
        program: flow.program.name,
        diameter: flow.silicon.diameter,
        steps: steps.filter((step) => step.flow.id === flow.id).length,
        updatedAt: flow.updatedAt.toISOString(),
        latest: newest
          ? { id: newest.id, number: newest.number, outcome: newest.outcome, at: newest.createdAt.toISOString() }
          : null,
      };
    });
    return { rows, total, params };
  });
}

/** One flow, whole. */
export async function getFlow(scope: ActorScope, id: string | undefined): Promise<FlowDetail> {
  return inScope(scope, (em) => readFlow(em, scope, idFrom(id, "flow")));
}

/** Changes a flow's head: name, silicon, incoming thickness, note. Its program stays. */
export async function changeFlow(
  scope: ActorScope,
  { id, version, values }: { id: string; version: number | null; values: FlowValues },
): Promise<FlowSaved> {
  return changePlan(scope, { flowId: id, version }, async ({ plan }) => {
    const { program: _program, ...head } = values;
    return { plan: { ...plan, ...head }, words: "Changed name and wafer", shown: id };
  });
}

/** Removes a flow that was never assessed; one that was is kept, because its assessments are. */
export async function removeFlow(scope: ActorScope, id: string): Promise<void> {
  await inScope(scope, async (em) => {
    const flow = await findFlow(em, scope, id);
    requireInProgram(scope, "edit stacks and flows", flow.program.id, "flow");
    if ((await em.count(Assessment, { flow: flow.id })) > 0)
      throw problem(409, "This flow has been assessed, so it is kept with its assessments.");
    em.remove(flow);
    await em.flush();
  });
}
