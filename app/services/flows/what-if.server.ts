import type { EntityManager } from "@mikro-orm/postgresql";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { Carrier } from "#app/db/entities/carrier.ts";
import { changedPlan } from "#app/lib/what-if.ts";
import { whatIfWords } from "#app/lib/what-if-words.ts";
import type { FlowDetail } from "#app/schemas/flow-view.ts";
import { readWhatIf } from "#app/schemas/what-if-form.ts";
import type { WhatIfSnapshot } from "#app/schemas/what-if.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { readLimits } from "../limits.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { changePlan, type FlowPlace, type FlowSaved } from "./change-flow.server.ts";
import { bondingMaterialInput, carrierInput, flowInputOf } from "./flow-inputs.ts";
import { readFlow } from "./read-flow.server.ts";

async function snapshotOf(em: EntityManager, flow: FlowDetail): Promise<WhatIfSnapshot> {
  const byName = { orderBy: { name: "asc" as const } };
  return {
    version: flow.stamp.version,
    input: flowInputOf(flow),
    limits: await readLimits(em),
    stepIds: flow.steps.map(({ id }) => id),
    carriers: (await em.find(Carrier, {}, byName)).map(carrierInput),
    materials: (await em.find(BondingMaterial, {}, byName)).map(bondingMaterialInput),
  };
}

/** A flow exactly as the server would assess it, for the engine in the browser of somebody who may assess it. */
export async function whatIfSnapshot(scope: ActorScope, flowId: string | undefined): Promise<WhatIfSnapshot> {
  const id = idFrom(flowId, "flow");
  return inScope(scope, async (em) => {
    const flow = await readFlow(em, scope, id);
    requireInProgram(scope, "run assessments", flow.program.id, "flow");
    return snapshotOf(em, flow);
  });
}

/** Writes the changes of a what-if into the flow, as one change that can be taken back. */
export async function applyWhatIf(
  scope: ActorScope,
  place: FlowPlace,
  posted: FormDataEntryValue | null,
): Promise<FlowSaved> {
  const changes = readWhatIf(posted);
  if (!changes) throw problem(400, "These changes cannot be applied. Open the what-if again and make them anew.");
  return changePlan(scope, place, async ({ em, plan }) => {
    const flow = await readFlow(em, scope, place.flowId);
    const snapshot = await snapshotOf(em, flow);
    const stressOf = (stepId: string, film: number) =>
      flow.steps.find(({ id }) => id === stepId)?.films.filter(({ change }) => change === "adds")[film]?.stress ?? null;
    const known = changes.filter(({ step }) => snapshot.stepIds.includes(step));
    if (known.length === 0) return null;
    return {
      plan: changedPlan(plan, known, stressOf),
      words: `Took from a what-if: ${known.map((change) => whatIfWords(change, snapshot)).join("; ")}`,
      shown: known.at(-1)?.step ?? null,
    };
  });
}
