import { EngineInputError } from "../errors.ts";
import { solveLaminate } from "../laminate/solve-laminate.ts";
import type { SiteLimits } from "../rules/limits.ts";
import type { Holding, ShapeWord } from "../vocabulary.ts";
import { layersOf } from "./layers.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { FlowInput, StepInput } from "./model.ts";
import { lyingShape, shapeWord, type LyingShape } from "./shape.ts";
import { allFilms, applyStep, initialState, type WaferState } from "./state.ts";
import { settle, type Settled } from "./yield.ts";

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
  filmStress: { name: string; side: "front" | "back"; stress: number }[];
}

export interface WalkOptions {
  /** false keeps metals elastic, to show what their history does; default true */
  metalHistory?: boolean;
}

const FLAT_HOLDINGS: Holding[] = ["grinding tape", "film frame", "edge ring"];

/** Whether what holds the wafer keeps it flat, so that it has no bow of its own at that step. */
export function heldFlat(holding: Holding): boolean {
  return FLAT_HOLDINGS.includes(holding);
}

/**
 * Walks the wafer through its flow. Films come on before the hottest moment of their step; a bond and a debond are made at
 * it. Bows are those of the linear laminate put through the shape of a free disc, gravity left out.
 * @throws EngineInputError when a step leaves no silicon or an input is out of range; `field` names the step
 */
export function walkFlow(flow: FlowInput, limits: SiteLimits, options: WalkOptions = {}): { steps: StepState[] } {
  const metalHistory = options.metalHistory ?? true;
  const { orientation } = flow.wafer;
  let state = initialState(flow);
  const steps = flow.steps.map((step, index): StepState => {
    const field = `steps[${index}]`;
    const before = state;
    try {
      const applied = applyStep(before, step, field);
      const bonded = applied.bond !== null;
      const flat = heldFlat(step.planned);
      const hot = settle(applied, orientation, step.peakTemperature, { metalHistory, heldFlat: flat });
      const cold = settle(hot.state, orientation, ROOM_TEMPERATURE, { metalHistory, heldFlat: flat });
      state = cold.state;
      const bare = layersOf(state, orientation, ROOM_TEMPERATURE, { carrier: false });
      const free = bonded ? solveLaminate(bare.layers, { temperature: ROOM_TEMPERATURE }) : cold.solution;
      const shape = (at: Settled, temperature: number) =>
        lyingShape(flow.wafer, at.layers, at.solution, temperature, bonded);
      const atRoom = flat ? null : shape(cold, ROOM_TEMPERATURE);
      const heated = step.peakTemperature > ROOM_TEMPERATURE;
      return {
        number: index + 1,
        step,
        before,
        after: state,
        atRoom,
        atPeak: flat || !heated ? null : shape(hot, step.peakTemperature),
        released: lyingShape(flow.wafer, bare.layers, free, ROOM_TEMPERATURE, false),
        lies: shapeWord(atRoom, state.faceUp, limits.flatWithin.value),
        filmForce: filmForces(state),
        filmStress: cold.filmStress.map(({ film, stress }) => ({
          name: film.addition.film.name,
          side: film.addition.side,
          stress,
        })),
      };
    } catch (error) {
      throw error instanceof EngineInputError ? atStep(error, field) : error;
    }
  });
  return { steps };
}

/** A refusal with the step that it concerns. A curvature is nobody's input, so that one is said by its causes. */
function atStep({ field, reason, allowed }: EngineInputError, step: string): EngineInputError {
  if (field.startsWith("steps[")) return new EngineInputError(field, reason, allowed);
  if (field === "linearCurvature")
    return new EngineInputError(
      step,
      "the films would bend the wafer beyond anything that can be computed. Check their thickness, stress and modulus, and the silicon left",
    );
  return new EngineInputError(`${step}.${field}`, reason, allowed);
}

/** Rigid-substrate force of each side's films as they are now: what they would pull with if the silicon were thick. */
function filmForces(state: WaferState): StepState["filmForce"] {
  const force = (side: "front" | "back") =>
    allFilms(state)
      .filter(({ addition }) => addition.side === side)
      .reduce((sum, film) => {
        const { addition, plasticStrain } = film;
        const { youngsModulus, poissonsRatio } = addition.film;
        const modulus = youngsModulus.value / (1 - poissonsRatio.value);
        return sum + (addition.stress.value - modulus * plasticStrain) * addition.thickness.value * addition.coverage;
      }, 0);
  return { front: force("front"), back: force("back") + state.groundFaceForce };
}
