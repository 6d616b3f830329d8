import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { SiteLimits } from "../rules/limits.ts";
import type { ShapeWord } from "../vocabulary.ts";
import type { FlowInput, StepInput } from "./model.ts";
import { stepRemarks } from "./remarks.ts";
import { filmStresses } from "./settle.ts";
import { shapeWord, type LyingShape } from "./shape.ts";
import { allFilms, initialState, type WaferState } from "./state.ts";
import { inStep, peakShape, releasedShape, roomShape, stepField, takeStep, type WalkedStep } from "./step.ts";

/** One step of a walked flow: the wafer before and after, and its shapes. */
export interface StepState {
  number: number;
  step: StepInput;
  before: WaferState;
  after: WaferState;
  /** at 25 °C after the step as it lies on the tool; null when tape or frame holds it flat */
  atRoom: LyingShape | null;
  /** at the hottest of the step; null at room temperature or when tape or frame holds it flat */
  atPeak: LyingShape | null;
  /** at 25 °C as it would lie if nothing held it */
  released: LyingShape;
  lies: ShapeWord;
  /** sum of σ·h·coverage over the films of a side at 25 °C, N/m; the back includes the ground face */
  filmForce: { front: number; back: number };
  /** what the figures of this step rest on that nobody stated, a sentence each */
  remarks: string[];
  filmStress: FilmHistory[];
}

/** A film after a step, at 25 °C, with what it has been through. */
export interface FilmHistory {
  name: string;
  side: "front" | "back";
  /** mean stress, Pa */
  stress: number;
  /** strain left by yielding, biaxial, tension positive */
  plasticStrain: number;
  /** hottest so far, K */
  hottest: number;
  /** whether it has been hot since it came, so that a stress measured before no longer holds for a metal */
  state: "as deposited" | "after its hottest step";
}

export interface WalkOptions {
  /** false keeps metals elastic, to show what their history does; default true */
  metalHistory?: boolean;
}

/**
 * Walks the wafer through its flow. Films come on before the hottest moment of their step; a bond and a debond are made at
 * it. Bows are those of the linear laminate put through the shape of a free disc, gravity left out.
 * @throws EngineInputError when a step leaves no silicon or an input is out of range; `field` names the step
 */
export function walkFlow(flow: FlowInput, limits: SiteLimits, options: WalkOptions = {}): { steps: StepState[] } {
  const metalHistory = options.metalHistory ?? true;
  let state = initialState(flow);
  const steps = flow.steps.map((step, index): StepState =>
    inStep(index, () => {
      const before = state;
      const walked = takeStep(flow.wafer, before, step, { field: stepField(index), metalHistory });
      state = walked.after;
      return describeStep(flow, limits, { number: index + 1, step, before }, walked);
    }),
  );
  return { steps };
}

/** A walked step with its shapes and what else is said of it. */
export function describeStep(
  flow: FlowInput,
  limits: SiteLimits,
  place: Pick<StepState, "number" | "step" | "before">,
  walked: WalkedStep,
): StepState {
  const { wafer } = flow;
  const { after } = walked;
  const atRoom = roomShape(wafer, walked);
  return {
    ...place,
    after,
    atRoom,
    atPeak: peakShape(wafer, walked),
    released: atRoom && after.bonds.length === 0 ? atRoom : releasedShape(wafer, walked),
    lies: shapeWord(atRoom, after.faceUp, limits.flatWithin.value),
    filmForce: filmForces(after),
    remarks: stepRemarks(flow, place.number, place.step, after),
    filmStress: filmHistories(walked),
  };
}

function filmHistories({ after, cold }: WalkedStep): FilmHistory[] {
  const films = [...after.back.toReversed(), ...after.front];
  return filmStresses(cold).map(({ stress }, n) => {
    const film = films[n];
    if (!film) throw new Error("a settled stack has the films of its state");
    const { addition, plasticStrain, hottest } = film;
    return {
      name: addition.film.name,
      side: addition.side,
      stress,
      plasticStrain,
      hottest,
      state: hottest > ROOM_TEMPERATURE ? "after its hottest step" : "as deposited",
    };
  });
}

/** Rigid-substrate force of each side's films as they are now: what they would pull with if the silicon were thick. */
function filmForces(state: WaferState): StepState["filmForce"] {
  const force = (side: "front" | "back") =>
    allFilms(state)
      .filter(({ addition }) => addition.side === side)
      .reduce((sum, { entry, plasticStrain }) => {
        const { stress, biaxialModulus, thickness, coverage } = entry.layer;
        return sum + (stress - biaxialModulus * plasticStrain) * thickness * coverage;
      }, 0);
  return { front: force("front"), back: force("back") + state.groundFaceForce };
}
