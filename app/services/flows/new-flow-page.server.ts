import { Flow } from "#app/db/entities/flow.ts";
import { FlowTemplate } from "#app/db/entities/flow-template.ts";
import { completeStep } from "#app/lib/blank-step.ts";
import { proposeSteps } from "#app/lib/flow-from-stack.ts";
import { proposedRows } from "#app/lib/flow-proposed-rows.ts";
import { stepRows, type StepRow } from "#app/lib/flow-rows.ts";
import { incomingShapeTexts, measuredText } from "#app/lib/form-values.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { NewFlowValues, StepValues } from "#app/schemas/flow.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram, requireInSomeProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";
import type { Saved } from "../record.server.ts";
import { idFrom } from "../uuid.server.ts";
import { findFlowTemplate } from "./flow-templates.server.ts";
import { headChoices } from "./head-choices.server.ts";
import { createFlow } from "./new-flow.server.ts";
import { readPlan } from "./plan.server.ts";
import { findFlow } from "./read-flow.server.ts";
import { startFromStack } from "./stack-start.server.ts";
import { stepChoices } from "./step-choices.server.ts";
import { stepDetails } from "./step-details.server.ts";

/** What the steps of a new flow come from. */
export interface NewFlowOrigin {
  kind: "stack" | "template" | "flow";
  id: string;
  name: string;
  rows: StepRow[];
}

const um = (length: Measured) => measuredText(length, "length", { unit: "µm" });

/** What the page of a new flow offers; with the first steps when it starts from a stack, a template or another flow. */
export async function newFlowPage(scope: ActorScope, search: URLSearchParams) {
  requireInSomeProgram(scope, "edit stacks and flows");
  const [stack, template, flow] = [search.get("stack"), search.get("template"), search.get("flow")];
  if (stack) return fromStack(scope, stack);
  if (template) return fromTemplate(scope, template);
  if (flow) return fromFlow(scope, flow);
  const { programs, silicon } = await headChoices(scope);
  return {
    origin: null,
    offers: await offers(scope),
    program: programs,
    silicon,
    bond: null,
    values: { program: programs.length === 1 ? programs[0]?.value : "" },
  };
}

/** What a new flow can start from besides nothing. */
async function offers(scope: ActorScope) {
  return inScope(scope, async (em) => ({
    templates: (await em.find(FlowTemplate, {}, { fields: ["name"], orderBy: { name: "asc" } })).map(
      ({ id, name }) => ({
        id,
        name,
      }),
    ),
    flows: (
      await em.find(
        Flow,
        { program: programFilter(scope.actor, "edit stacks and flows", undefined) },
        { fields: ["name"], orderBy: { name: "asc" }, limit: 200 },
      )
    ).map(({ id, name }) => ({ id, name })),
  }));
}

async function fromStack(scope: ActorScope, stackId: string) {
  const { silicon } = await headChoices(scope);
  const from = await startFromStack(scope, idFrom(stackId, "stack"));
  const { carriers, materials } = from.needsCarrier ? await stepChoices(scope) : { carriers: [], materials: [] };
  const wafer = silicon.find(({ value }) => value === from.siliconId);
  const origin: NewFlowOrigin = { kind: "stack", ...from.stack, rows: proposedRows(from.start) };
  return {
    origin,
    offers: null,
    program: { id: from.program.id, name: from.program.name },
    silicon: { id: from.siliconId, name: wafer?.label ?? "" },
    bond: from.needsCarrier ? { carriers, materials } : null,
    values: { name: from.stack.name, incomingThickness: um(from.incoming) },
  };
}

async function fromTemplate(scope: ActorScope, templateId: string) {
  const { programs, silicon } = await headChoices(scope);
  const id = idFrom(templateId, "flow template");
  const { template, details } = await inScope(scope, async (em) => {
    const found = await findFlowTemplate(em, id);
    const plan = found.steps.map((step, index) => ({ ...completeStep(step), id: String(index) }));
    return { template: found, details: await stepDetails(em, plan) };
  });
  const { name, incomingThickness, diameter } = template;
  const origin: NewFlowOrigin = { kind: "template", id, name, rows: stepRows(details, incomingThickness) };
  const millimetres = `${Math.round(diameter * 1000)} mm`;
  return {
    origin,
    offers: null,
    program: programs,
    silicon,
    bond: null,
    values: {
      name,
      program: programs.length === 1 ? programs[0]?.value : "",
      silicon: silicon.find(({ label }) => label.replaceAll("\u00A0", " ").includes(millimetres))?.value ?? "",
      incomingThickness: um(incomingThickness),
    },
  };
}

async function fromFlow(scope: ActorScope, flowId: string) {
  const { silicon } = await headChoices(scope);
  const id = idFrom(flowId, "flow");
  const { flow, plan, details } = await inScope(scope, async (em) => {
    const found = await findFlow(em, scope, id);
    requireInProgram(scope, "edit stacks and flows", found.program.id, "flow");
    const stored = await readPlan(em, found);
    return { flow: found, plan: stored.plan, details: await stepDetails(em, stored.plan.steps) };
  });
  const origin: NewFlowOrigin = {
    kind: "flow",
    id,
    name: flow.name,
    rows: stepRows(details, plan.incomingThickness),
  };
  return {
    origin,
    offers: null,
    program: { id: flow.program.id, name: flow.program.name },
    silicon,
    bond: null,
    values: {
      name: `${flow.name}, copy`.slice(0, 120),
      note: plan.note,
      silicon: plan.silicon,
      waferKind: plan.waferKind,
      incomingThickness: um(plan.incomingThickness),
      ...incomingShapeTexts(plan),
      ...(plan.gateBow && { gateBow: um(plan.gateBow) }),
      ...(plan.gateWarp && { gateWarp: um(plan.gateWarp) }),
    },
  };
}

export type AddedFlow = Saved | { outcome: "bond missing"; fieldErrors: Record<string, string[]> };

/**
 * Adds a flow: empty, or with the steps of what it starts from. One that starts from a stack has its program and silicon, one
 * that starts from a flow its program. A stack that needs a carrier is refused until both carrier and bonding material are
 * chosen.
 */
export async function addFlow(scope: ActorScope, values: NewFlowValues): Promise<AddedFlow> {
  const { stack, template, flow, carrier, bondingMaterial, ...head } = values;
  if (template) {
    const { name, steps } = await inScope(scope, (em) => findFlowTemplate(em, template));
    return createFlow(scope, head, { steps: steps.map(completeStep), words: `Began from the template ${name}` });
  }
  if (flow) {
    const { original, plan } = await inScope(scope, async (em) => {
      const found = await findFlow(em, scope, flow);
      return { original: found, plan: (await readPlan(em, found)).plan };
    });
    const steps: StepValues[] = plan.steps;
    return createFlow(
      scope,
      { ...head, program: original.program.id },
      { steps, words: `Copied from ${original.name}` },
    );
  }
  if (!stack) return createFlow(scope, head);
  const from = await startFromStack(scope, stack, { incoming: head.incomingThickness, carrier, bondingMaterial });
  if (from.needsCarrier && !from.start.bond)
    return {
      outcome: "bond missing",
      fieldErrors: {
        ...(from.missing.carrier ? { carrier: ["This stack is thinned on a carrier: choose it."] } : {}),
        ...(from.missing.bondingMaterial ? { bondingMaterial: ["Choose the bonding material."] } : {}),
      },
    };
  return createFlow(
    scope,
    { ...head, program: from.program.id, silicon: from.siliconId },
    { steps: proposeSteps(from.start), words: `Began from the stack ${from.stack.name}` },
  );
}
