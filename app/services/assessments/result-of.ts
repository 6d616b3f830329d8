import { answerSentences } from "#app/engine/flow/answer.ts";
import type { FlowAssessment } from "#app/engine/flow/assess.ts";
import type { AssessedStep } from "#app/engine/flow/judge.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { edgesUp, type LyingShape } from "#app/engine/flow/shape.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { warpWorking } from "#app/engine/rules/warp-working.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import type { FaceUp } from "#app/engine/vocabulary.ts";
import type { AssessmentResult, BondResult, ShapeResult, StepResult } from "#app/schemas/assessment-result.ts";

/** The engine's answer in the form in which it is stored: plain, with the standard bow. */
export function resultOf(flow: FlowInput, limits: SiteLimits, assessment: FlowAssessment): AssessmentResult {
  const { name, diameter, orientation, thickness } = flow.wafer;
  return {
    wafer: { name, diameter, orientation, thickness: thickness.value },
    sentences: answerSentences(flow, assessment),
    verdict: assessment.verdict,
    steps: assessment.steps.map(stepResult),
    findings: assessment.findings,
    assumed: assessment.assumed,
    inputs: assessment.inputs,
    bonds: bondsOf(assessment.steps),
    tapeTemperature: limits.tapeTemperature.value,
  };
}

const shownContributions = 6;

function stepResult({ state, required, outcome, uncertainty, budget }: AssessedStep): StepResult {
  const { step, before, after } = state;
  const shape = (lying: LyingShape | null, u: number | null) =>
    lying && { ...shapeResult(lying, u, after.faceUp), working: warpWorking(lying) };
  // Nothing holds a bare wafer: let go, it lies as it does.
  const held = step.planned !== "bare";
  return {
    number: state.number,
    kind: step.kind,
    title: step.title,
    peakTemperature: step.peakTemperature,
    holdTime: step.holdTime,
    exposures: step.exposures,
    equipment: step.equipment && {
      name: step.equipment.name,
      edgesUp: step.equipment.warpLimitEdgesUp?.value ?? null,
      edgesDown: step.equipment.warpLimitEdgesDown?.value ?? null,
    },
    siliconBefore: before.silicon.value,
    silicon: after.silicon.value,
    siliconLeast: after.silicon.value - (after.silicon.tolerance ?? 0),
    siliconTolerance: after.silicon.tolerance,
    planned: step.planned,
    plannedName: step.planned === "carrier" && after.bond ? after.bond.carrier.name : step.planned,
    required: required ?? "none fits",
    faceUp: after.faceUp,
    lies: state.lies,
    atRoom: shape(state.atRoom, uncertainty.atRoom),
    atPeak: shape(state.atPeak, uncertainty.atPeak),
    released: {
      ...shapeResult(state.released, null, "device side"),
      working: held ? warpWorking(state.released) : null,
    },
    remarks: state.remarks,
    filmForce: state.filmForce,
    outcome,
    budget: budget.slice(0, shownContributions),
  };
}

function shapeResult(
  lying: LyingShape,
  standardUncertainty: number | null,
  faceUp: FaceUp,
): Omit<ShapeResult, "working"> {
  return {
    temperature: lying.temperature,
    bow: standardBow(lying.sagitta),
    warp: lying.warp,
    edgesUp: edgesUp(lying, faceUp),
    regime: lying.regime,
    stabilityRatio: lying.stabilityRatio,
    rollRadius: lying.rollRadius,
    standardUncertainty,
  };
}

/** Every bond of the flow with the steps over which it lasts. */
function bondsOf(steps: AssessedStep[]): BondResult[] {
  const bonds: BondResult[] = [];
  let open: BondResult | null = null;
  for (const { state } of steps) {
    const { bond } = state.after;
    if (!bond) {
      open = null;
    } else if (open) {
      open.toStep = state.number;
    } else {
      open = {
        fromStep: state.number,
        toStep: state.number,
        carrier: bond.carrier.name,
        carrierDiameter: bond.carrier.diameter,
        material: bond.material.name,
        thickness: bond.thickness.value,
        temperatureLimit: bond.material.temperatureLimit.value,
        flowsFrom: bond.material.flows ? (bond.material.softening?.value ?? null) : null,
        release: bond.material.release,
      };
      bonds.push(open);
    }
  }
  return bonds;
}
