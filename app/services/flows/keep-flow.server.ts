import type { EntityManager } from "@mikro-orm/postgresql";
import { FlowTemplate } from "#app/db/entities/flow-template.ts";
import { forLibrary } from "#app/lib/step-edits.ts";
import type { KeepFlowPage } from "#app/schemas/template-view.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram, requireOnSite } from "../permission.server.ts";
import { newRecord } from "../record.server.ts";
import { idFrom } from "../uuid.server.ts";
import { findFlowTemplate } from "./flow-templates.server.ts";
import { freeName, takingName } from "./free-name.server.ts";
import { readPlan } from "./plan.server.ts";
import { findFlow } from "./read-flow.server.ts";

/** A flow that the person may keep, as a template has it. */
async function keptFlow(em: EntityManager, scope: ActorScope, flowId: string) {
  const flow = await findFlow(em, scope, flowId);
  requireInProgram(scope, "edit stacks and flows", flow.program.id, "flow");
  const { plan } = await readPlan(em, flow);
  return {
    flow,
    columns: {
      diameter: flow.silicon.diameter,
      incomingThickness: plan.incomingThickness,
      steps: plan.steps.map(({ id: _id, ...step }) => forLibrary(step)),
    },
  };
}

const templatesByName = (em: EntityManager) =>
  em.find(FlowTemplate, {}, { fields: ["name"], orderBy: { name: "asc" } });

/** A flow that is to be kept, and the templates whose place it may take. @throws 403, 404 as `keepFlow` */
export async function keepFlowPage(scope: ActorScope, flowId: string | undefined): Promise<KeepFlowPage> {
  const id = idFrom(flowId, "flow");
  return inScope(scope, async (em) => {
    const { flow, columns } = await keptFlow(em, scope, id);
    requireOnSite(scope, "edit the step library");
    const templates = (await templatesByName(em)).map(({ id: templateId, name }) => ({ id: templateId, name }));
    return {
      flow: { id: flow.id, name: flow.name, steps: columns.steps.length },
      newName: freeName(flow.name, new Set(templates.map(({ name }) => name))),
      templates,
    };
  });
}

/** Keeps a flow as a template for the whole site, under its name or the next free one. Its name and steps are then seen by all programs. */
export async function keepFlow(scope: ActorScope, flowId: string): Promise<string> {
  requireOnSite(scope, "edit the step library");
  return takingName(() =>
    inScope(scope, async (em) => {
      const { flow, columns } = await keptFlow(em, scope, flowId);
      const taken = await templatesByName(em);
      const kept = em.create(FlowTemplate, {
        ...newRecord(scope),
        name: freeName(flow.name, new Set(taken.map(({ name }) => name))),
        note: "",
        ...columns,
      });
      await em.flush();
      return kept.id;
    }),
  );
}

/** Puts a flow in the place of a template, whose name and note stay. Flows that began from it stay as they are. */
export async function replaceFlowTemplate(scope: ActorScope, flowId: string, templateId: string): Promise<void> {
  requireOnSite(scope, "edit the step library");
  await inScope(scope, async (em) => {
    const { columns } = await keptFlow(em, scope, flowId);
    const template = await findFlowTemplate(em, templateId);
    em.assign(
      template,
      { ...columns, updatedAt: new Date(), updatedBy: scope.actor.id },
      { mergeObjectProperties: false },
    );
    await em.flush();
  });
}
