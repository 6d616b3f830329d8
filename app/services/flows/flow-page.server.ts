import { legsOfSteps, slotsInWords } from "#app/engine/flow/legs.ts";
import type { Measured } from "#app/engine/measured.ts";
import { planColumns } from "#app/lib/flow-plan.ts";
import { stepRows, type StepRow } from "#app/lib/flow-rows.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import type { FlowHistory } from "#app/schemas/flow-plan.ts";
import type { FlowAssessmentRow } from "#app/schemas/flow-view.ts";
import type { FlowLotRow } from "#app/schemas/lot.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { idFrom } from "../uuid.server.ts";
import { flowAssessments } from "./flow-assessments.server.ts";
import { flowLots } from "./flow-lots.server.ts";
import { readFlow } from "./read-flow.server.ts";
import { flowHistory } from "./revisions.server.ts";

/** A flow as its page shows it: text, not the materials behind it. */
export interface FlowPage {
  id: string;
  name: string;
  note: string;
  program: string;
  silicon: { name: string; diameter: number };
  incoming: Measured;
  /** measured standard bow along and across the notch, m */
  incomingBow: { along: Measured; across: Measured } | null;
  /** thinnest silicon of the flow, and its hottest step; SI, null without steps */
  thinnest: Measured | null;
  hottest: number | null;
  rows: StepRow[];
  plan: ReturnType<typeof planColumns>;
  /** the slots of each leg, in words; empty where every wafer takes every step */
  legs: string[];
  /** newest first */
  assessments: FlowAssessmentRow[];
  /** kept lots, newest first */
  lots: FlowLotRow[];
  /** null for those who may only read */
  history: FlowHistory | null;
  stamp: RecordStamp;
  mayEdit: boolean;
  mayAssess: boolean;
  /** in the library of the site */
  mayKeep: boolean;
}

/** One flow with its rows, its plan to draw and its assessments, newest first. */
export async function flowPage(scope: ActorScope, flowId: string | undefined): Promise<FlowPage> {
  const id = idFrom(flowId, "flow");
  const { flow, assessments, lots, history } = await inScope(scope, async (em) => {
    const found = await readFlow(em, scope, id);
    return {
      flow: found,
      assessments: await flowAssessments(em, scope, found),
      lots: await flowLots(em, id),
      history: found.mayEdit ? await flowHistory(em, id) : null,
    };
  });
  const { silicon, incomingThickness, incomingBowAlong: along, incomingBowAcross: across, steps } = flow;
  const thicknesses = [incomingThickness, ...steps.flatMap(({ siliconAfter }) => siliconAfter ?? [])];
  return {
    id: flow.id,
    name: flow.name,
    note: flow.note,
    program: flow.program.name,
    silicon: { name: silicon.name, diameter: silicon.diameter },
    incoming: incomingThickness,
    incomingBow: along && across ? { along, across } : null,
    thinnest:
      steps.length === 0 ? null : thicknesses.reduce((least, next) => (next.value < least.value ? next : least)),
    hottest: steps.length === 0 ? null : Math.max(...steps.map(({ peakTemperature }) => peakTemperature)),
    rows: stepRows(steps, incomingThickness),
    plan: planColumns(steps, incomingThickness),
    legs: legsInWords(steps),
    assessments,
    lots,
    history,
    stamp: flow.stamp,
    mayEdit: flow.mayEdit,
    mayAssess: flow.mayAssess,
    mayKeep: steps.length > 0 && mayOnSite(scope.actor, "edit the step library"),
  };
}

function legsInWords(steps: readonly { handling: { slots?: number[] | null } }[]): string[] {
  const legs = legsOfSteps(steps.map(({ handling }) => handling));
  return legs.length > 1 ? legs.map(slotsInWords) : [];
}
