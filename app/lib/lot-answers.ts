import { EngineInputError } from "#app/engine/errors.ts";
import { edgesUp } from "#app/engine/flow/shape.ts";
import { legOfSlot } from "#app/engine/flow/legs.ts";
import { faceUpLoaded } from "#app/engine/flow/state.ts";
import { walkFlow, type StepState } from "#app/engine/flow/walk.ts";
import type { Finding } from "#app/engine/rules/finding.ts";
import { judgeStep } from "#app/engine/rules/judge-step.ts";
import { previousStep } from "#app/engine/rules/other-steps.ts";
import { warpRule } from "#app/engine/rules/rule-02-warp.ts";
import { outcomeRank } from "#app/engine/vocabulary.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { LotInput, LotWafer, WaferAnswer } from "#app/schemas/lot.ts";
import { withLot } from "./lot-input.ts";
import { lotFault } from "./lot-words.ts";

/**
 * One wafer of a lot walked through its flow, of one that parts by slot the leg of its slot, with its own bow and thickness, and
 * judged by its warp on every tool: where it comes nearest to a limit. A wafer that cannot be computed cannot be judged; it is never left out.
 */
export function waferAnswer(input: AssessmentInput, lot: LotInput, wafer: LotWafer): WaferAnswer {
  try {
    const { flow: whole, limits } = withLot(input, { ...lot, bow: wafer.bow, thickness: wafer.thickness });
    const flow = legOfSlot(whole, wafer.slot);
    const { steps } = walkFlow(flow, limits);
    const context = { flow, limits, steps, uncertainty: [], workings: null };
    const findings = steps.flatMap((state) => judgeStep(context, state, [warpRule]));
    const worst = tightest(findings.filter(({ figures }) => figures.length > 0));
    const missing = findings.find(({ outcome }) => outcome === "cannot judge");
    if (!worst) return { ...wafer, outcome: "cannot judge", at: null, reason: missing?.reason ?? NO_LIMIT };
    return {
      ...wafer,
      outcome: worst.outcome,
      at: placeOf(steps, worst),
      reason: worst.outcome === "cannot judge" ? worst.reason : null,
    };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return { ...wafer, outcome: "cannot judge", at: null, reason: lotFault(error, { wafers: [] }).reason };
  }
}

const NO_LIMIT = "No step of the flow has a warp to judge.";

/** The worst; of equally bad ones that which is nearest to, or farthest beyond, its limit. */
function tightest(findings: Finding[]): Finding | null {
  const use = ({ figures, limit }: Finding) => (figures[0]?.value ?? 0) / (limit?.value ?? Infinity);
  return findings.reduce<Finding | null>((most, next) => {
    if (!most) return next;
    const worse = outcomeRank(next.outcome) - outcomeRank(most.outcome);
    return worse > 0 || (worse === 0 && use(next) > use(most)) ? next : most;
  }, null);
}

function placeOf(steps: readonly StepState[], { step, figures, limit }: Finding): WaferAnswer["at"] {
  const warp = figures[0]?.value ?? 0;
  const own = steps[step - 1];
  const before = own && previousStep(steps, own);
  const shapes = [
    { shape: before?.atRoom, faceUp: own && faceUpLoaded(own.before, own.step) },
    { shape: own?.atRoom, faceUp: own?.after.faceUp },
    { shape: own?.atPeak, faceUp: own?.after.faceUp },
  ];
  const judged = shapes.find(({ shape }) => shape?.warp === warp);
  const up = judged?.shape && judged.faceUp ? edgesUp(judged.shape, judged.faceUp) : false;
  return {
    step,
    title: own?.step.title ?? "",
    warp,
    limit: limit?.value ?? null,
    rolled: judged?.shape?.regime === "curled",
    lies: up ? "edges up" : "edges down",
  };
}
