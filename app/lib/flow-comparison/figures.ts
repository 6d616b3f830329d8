import { legFlows } from "#app/engine/flow/legs.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { flowMovers, type FlowMover } from "./movers.ts";
import { decidingWarp, type DecidingWarp } from "./tightest.ts";
import { thinningOf, type Thinning } from "./thinning.ts";

/** What was worked out of a flow; of one that parts by slot, of its worst leg. */
export interface FlowFigures {
  result: AssessmentResult;
  /** null for a flow that thins nothing */
  thinning: Thinning | null;
  deciding: DecidingWarp | null;
  /** inputs by how far they move the deciding warp */
  movers: FlowMover[];
  /** films put down, in the order of the steps; of those that came with the wafer too; thickness in m */
  films: { name: string; thickness: number }[];
}

/** A flow that is compared, with the letter that stands for it. */
export interface ComparedFlow {
  id: string;
  letter: string;
  name: string;
  program: { name: string };
  /** ISO date and time */
  changedAt: string;
  silicon: { name: string; diameter: number };
  assessed: { id: string; revision: string; date: string; outOfDate: boolean } | null;
  /** null where the flow cannot be walked */
  figures: FlowFigures | null;
  /** why it cannot be walked */
  reason: string | null;
}

/**
 * Figures of a walked flow that its result does not have.
 * @throws EngineInputError when it cannot be walked
 */
export function flowFigures(flow: FlowInput, result: AssessmentResult): FlowFigures {
  const slots = result.slots?.join(" ");
  const leg = legFlows(flow).find((each) => each.leg?.slots.join(" ") === slots) ?? flow;
  const deciding = decidingWarp(result);
  return {
    result,
    thinning: thinningOf(leg),
    deciding,
    films: leg.steps.flatMap(({ adds }) =>
      adds.map(({ film: { name }, thickness }) => ({ name, thickness: thickness.value })),
    ),
    movers: deciding ? flowMovers(leg, { step: deciding.step.number, moment: deciding.moment }) : [],
  };
}
