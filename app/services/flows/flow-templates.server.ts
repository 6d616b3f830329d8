import type { EntityManager } from "@mikro-orm/postgresql";
import { FlowTemplate } from "#app/db/entities/flow-template.ts";
import { completeStep } from "#app/lib/blank-step.ts";
import { stepRows } from "#app/lib/flow-rows.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import type { FlowTemplateDetail, FlowTemplateRow } from "#app/schemas/template-view.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { stampOf } from "../record.server.ts";
import { idFrom } from "../uuid.server.ts";
import { stepDetails } from "./step-details.server.ts";

export const FLOW_TEMPLATE_SORTS = ["name", "diameter", "updated"] as const;

const rowOf = ({ id, name, note, diameter, steps, updatedAt }: FlowTemplate): FlowTemplateRow => ({
  id,
  name,
  note,
  diameter,
  steps: steps.length,
  updatedAt: updatedAt.toISOString(),
});

/** A page of the site's flow templates. */
export async function listFlowTemplates(scope: ActorScope, params: ListParams): Promise<ListPage<FlowTemplateRow>> {
  requireOnSite(scope, "see the library");
  return inScope(scope, async (em) => {
    const direction = params.descending ? "desc" : "asc";
    const [found, total] = await em.findAndCount(
      FlowTemplate,
      params.query ? { name: { $ilike: `%${escapeLike(params.query)}%` } } : {},
      {
        orderBy: [
          params.sort === "diameter"
            ? { diameter: direction }
            : params.sort === "updated"
              ? { updatedAt: direction }
              : { name: direction },
          { id: "asc" },
        ],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    return { rows: found.map(rowOf), total, params };
  });
}

/** The flow template that an id names. */
export async function findFlowTemplate(em: EntityManager, id: string): Promise<FlowTemplate> {
  const template = await em.findOne(FlowTemplate, { id }, { populate: ["updatedBy"] });
  if (!template) throw notFound("flow template");
  return template;
}

/** One flow template with its steps. */
export async function getFlowTemplate(scope: ActorScope, id: string | undefined): Promise<FlowTemplateDetail> {
  requireOnSite(scope, "see the library");
  const templateId = idFrom(id, "flow template");
  return inScope(scope, async (em) => {
    const template = await findFlowTemplate(em, templateId);
    const { name, note, diameter, incomingThickness } = template;
    const plan = template.steps.map((step, index) => ({ ...completeStep(step), id: String(index) }));
    return {
      id: template.id,
      name,
      note,
      diameter,
      rows: stepRows(await stepDetails(em, plan), incomingThickness),
      stamp: stampOf(template),
      mayEdit: mayOnSite(scope.actor, "edit the step library"),
    };
  });
}

/** Renames a flow template, or changes its note. */
export async function renameFlowTemplate(
  scope: ActorScope,
  id: string,
  { name, note }: { name: string; note: string },
): Promise<"saved" | "name taken"> {
  requireOnSite(scope, "edit the step library");
  return inScope(scope, async (em) => {
    const template = await findFlowTemplate(em, id);
    const namesake = await em.findOne(FlowTemplate, { name });
    if (namesake && namesake.id !== id) return "name taken";
    em.assign(template, { name, note, updatedAt: new Date(), updatedBy: scope.actor.id });
    await em.flush();
    return "saved";
  });
}

/** Removes a flow template. Flows that began from it stay. */
export async function removeFlowTemplate(scope: ActorScope, id: string): Promise<void> {
  requireOnSite(scope, "edit the step library");
  await inScope(scope, async (em) => {
    em.remove(await findFlowTemplate(em, id));
    await em.flush();
  });
}
