import { proposeSteps } from "#app/lib/flow-from-stack.ts";
import { proposedRows } from "#app/lib/flow-proposed-rows.ts";
import { measuredText } from "#app/lib/form-values.ts";
import type { NewFlowValues } from "#app/schemas/flow.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import type { Saved } from "../record.server.ts";
import { idFrom } from "../uuid.server.ts";
import { headChoices } from "./head-choices.server.ts";
import { createFlow } from "./new-flow.server.ts";
import { startFromStack } from "./stack-start.server.ts";
import { stepChoices } from "./step-choices.server.ts";

/** What the page of a new flow offers; with the steps proposed for a stack when it starts from one. */
export async function newFlowPage(scope: ActorScope, stackId: string | null) {
  requireInSomeProgram(scope, "edit stacks and flows");
  const { programs, silicon } = await headChoices(scope);
  if (!stackId)
    return {
      proposal: null,
      program: programs,
      silicon,
      bond: null,
      values: { program: programs.length === 1 ? programs[0]?.value : "" },
    };
  const from = await startFromStack(scope, idFrom(stackId, "stack"));
  const { carriers, materials } = from.needsCarrier ? await stepChoices(scope) : { carriers: [], materials: [] };
  const wafer = silicon.find(({ value }) => value === from.siliconId);
  return {
    proposal: { stack: from.stack, rows: proposedRows(from.start) },
    program: { id: from.program.id, name: from.program.name },
    silicon: { id: from.siliconId, name: wafer?.label ?? "" },
    bond: from.needsCarrier ? { carriers, materials } : null,
    values: { name: from.stack.name, incomingThickness: measuredText(from.incoming, "length", { unit: "µm" }) },
  };
}

export type AddedFlow = Saved | { outcome: "bond missing"; fieldErrors: Record<string, string[]> };

/**
 * Adds a flow: empty, or with the steps proposed for its stack, whose program and silicon it then has. A stack that needs a
 * carrier is refused until both carrier and bonding material are chosen.
 */
export async function addFlow(scope: ActorScope, values: NewFlowValues): Promise<AddedFlow> {
  const { stack, carrier, bondingMaterial, ...head } = values;
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
