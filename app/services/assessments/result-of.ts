import { answerSentences } from "#app/engine/flow/answer.ts";
import { inputsCounted, type FlowAssessment } from "#app/engine/flow/assess.ts";
import { bondedFace, bondOn } from "#app/engine/flow/bond.ts";
import type { AssessedStep } from "#app/engine/flow/judge.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { edgesUp, type LyingShape } from "#app/engine/flow/shape.ts";
import { faceUpLoaded } from "#app/engine/flow/state.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { warpWorking } from "#app/engine/rules/warp-working.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import type { FaceUp, Side } from "#app/engine/vocabulary.ts";
import { given } from "#app/lib/given.ts";
import type {
  AssessmentResult,
  BondResult,
  LegResult,
  ShapeResult,
  StepResult,
} from "#app/schemas/assessment-result.ts";

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
    ...given({ slots: assessment.slots ?? flow.leg?.slots, legs: legsOf(limits, assessment) }),
  };
}

/** Every leg of a flow that parts by slot; the worst stands in the result already. */
function legsOf(limits: SiteLimits, { legs, slots: worst }: FlowAssessment): LegResult[] | undefined {
  return legs?.map(({ flow, slots, verdict, steps, findings }) => ({
    slots,
    verdict,
    result: slots === worst ? null : resultOf(flow, limits, { steps, findings, verdict, ...inputsCounted(flow) }),
  }));
}

const shownContributions = 6;

function stepResult({ state, required, outcome, uncertainty, budget }: AssessedStep): StepResult {
  const { step, before, after } = state;
  const shape = (lying: LyingShape | null, u: number | null) =>
    lying && { ...shapeResult(lying, u, after.faceUp), working: warpWorking(lying) };
  // Nothing holds a bare wafer: let go, it lies as it does.
  const loaded = faceUpLoaded(before, step);
  const held = step.planned !== "bare";
  return {
    number: state.number,
    kind: step.kind,
    title: step.title,
    peakTemperature: step.peakTemperature,
    holdTime: step.holdTime,
    exposures: step.exposures,
    ...given({ profile: step.profile, machine: step.machine, recipe: step.recipe, slots: step.slots }),
    ...(step.skipped && { skipped: true as const }),
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
    plannedName:
      step.planned === "carrier" && after.bonds.length > 0
        ? after.bonds.map(({ carrier }) => carrier.name).join(" and ")
        : step.planned,
    required: required ?? "none fits",
    faceUp: after.faceUp,
    ...(loaded === before.faceUp ? {} : { loadedFaceUp: loaded }),
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
    ...(lying.unequal && { bowAcross: standardBow(lying.sagittaMinor) }),
    warp: lying.warp,
    edgesUp: edgesUp(lying, faceUp),
    regime: lying.regime,
    stabilityRatio: lying.stabilityRatio,
    rollRadius: lying.rollRadius,
    standardUncertainty,
  };
}

/** Every bond of the flow with its face and the steps over which it lasts. */
function bondsOf(steps: AssessedStep[]): BondResult[] {
  const bonds: BondResult[] = [];
  const open = new Map<Side, BondResult>();
  for (const { state } of steps) {
    for (const face of [...open.keys()]) if (!bondOn(state.after.bonds, face)) open.delete(face);
    for (const bond of state.after.bonds) {
      const face = bondedFace(bond);
      const known = open.get(face);
      if (known) {
        known.toStep = state.number;
        continue;
      }
      const made: BondResult = {
        fromStep: state.number,
        toStep: state.number,
        face,
        carrier: bond.carrier.name,
        ...given({ piece: bond.carrier.identity }),
        carrierDiameter: bond.carrier.diameter,
        material: bond.material.name,
        thickness: bond.thickness.value,
        temperatureLimit: bond.material.temperatureLimit.value,
        flowsFrom: bond.material.flows ? (bond.material.softening?.value ?? null) : null,
        release: bond.material.release,
      };
      open.set(face, made);
      bonds.push(made);
    }
  }
  return bonds;
}
