import type { EntityManager } from "@mikro-orm/postgresql";
import { StepTemplate } from "#app/db/entities/step-template.ts";
import { completeStep } from "#app/lib/blank-step.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { forLibrary } from "#app/lib/step-edits.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import type { StepTemplateDetail, StepTemplateRow } from "#app/schemas/template-view.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { newRecord, saveNamedRecord, saving, stampOf, type Saved } from "../record.server.ts";
import { idFrom } from "../uuid.server.ts";
import { freeName, takingName } from "./free-name.server.ts";
import { readPlan } from "./plan.server.ts";
import { findFlow } from "./read-flow.server.ts";
import { stepDetails } from "./step-details.server.ts";

export const STEP_TEMPLATE_SORTS = ["name", "kind", "updated"] as const;

/** A page of the site's steps, found by name or kind. */
export async function listStepTemplates(scope: ActorScope, params: ListParams): Promise<ListPage<StepTemplateRow>> {
  requireOnSite(scope, "see the library");
  return inScope(scope, async (em) => {
    const direction = params.descending ? "desc" : "asc";
    const like = { $ilike: `%${escapeLike(params.query)}%` };
    const [found, total] = await em.findAndCount(
      StepTemplate,
      params.query ? { $or: [{ name: like }, { kind: like as never }] } : {},
      {
        orderBy: [
          params.sort === "kind"
            ? { kind: direction }
            : params.sort === "updated"
              ? { updatedAt: direction }
              : { name: direction },
          { id: "asc" },
        ],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const rows = found.map(({ id, name, kind, step, updatedAt }) => ({
      id,
      name,
      kind,
      peakTemperature: step.peakTemperature,
      planned: step.planned,
      updatedAt: updatedAt.toISOString(),
    }));
    return { rows, total, params };
  });
}

async function findTemplate(em: EntityManager, id: string): Promise<StepTemplate> {
  const template = await em.findOne(StepTemplate, { id }, { populate: ["updatedBy"] });
  if (!template) throw notFound("step of the library");
  return template;
}

/** One step of the library. */
export async function getStepTemplate(scope: ActorScope, id: string | undefined): Promise<StepTemplateDetail> {
  requireOnSite(scope, "see the library");
  const templateId = idFrom(id, "step of the library");
  return inScope(scope, async (em) => {
    const template = await findTemplate(em, templateId);
    const [step] = await stepDetails(em, [{ ...completeStep(template.step), id: template.id }]);
    if (!step) throw notFound("step of the library");
    return {
      id: template.id,
      step,
      stamp: stampOf(template),
      mayEdit: mayOnSite(scope.actor, "edit the step library"),
    };
  });
}

/** Adds a step to the library, or changes one; its title is its name there. */
export async function saveStepTemplate(
  scope: ActorScope,
  { id, version, step }: { id: string | null; version: number | null; step: StepValues },
): Promise<Saved> {
  requireOnSite(scope, "edit the step library");
  const values = { name: step.title, kind: step.kind, step: forLibrary(step) };
  return saving(() =>
    inScope(scope, (em) =>
      saveNamedRecord(em, StepTemplate as never, "step of the library", scope, { id, version, values }),
    ),
  );
}

/** Takes a step out of the library. Flows that it was put into keep theirs. */
export async function removeStepTemplate(scope: ActorScope, id: string): Promise<void> {
  requireOnSite(scope, "edit the step library");
  await inScope(scope, async (em) => {
    em.remove(await findTemplate(em, id));
    await em.flush();
  });
}

/** Keeps a step of a flow in the library, under its title or the next free one. */
export async function keepStep(scope: ActorScope, flowId: string, stepId: string): Promise<string> {
  requireOnSite(scope, "edit the step library");
  return takingName(() =>
    inScope(scope, async (em) => {
      const { plan } = await readPlan(em, await findFlow(em, scope, flowId));
      const found = plan.steps.find(({ id }) => id === stepId);
      if (!found) throw notFound("step");
      const { id: _id, ...step } = found;
      const taken = await em.find(StepTemplate, {}, { fields: ["name"] });
      const title = freeName(step.title, new Set(taken.map(({ name }) => name)));
      const kept = em.create(StepTemplate, {
        ...newRecord(scope),
        name: title,
        kind: step.kind,
        step: forLibrary({ ...step, title }),
      });
      await em.flush();
      return kept.id;
    }),
  );
}
