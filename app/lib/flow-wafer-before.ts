import { EngineInputError } from "#app/engine/errors.ts";
import { bondedFace, type BondState } from "#app/engine/flow/bond.ts";
import { legFlows, slotsInWords } from "#app/engine/flow/legs.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { applyStep, initialState, type FilmState, type WaferState } from "#app/engine/flow/state.ts";
import { SIDE_NAMES, type FaceUp } from "#app/engine/vocabulary.ts";
import { filmCutWords } from "./film-cut.ts";
import { filmThicknessText, siliconText } from "./flow-thickness.ts";

/** The wafer as a step finds it, in words. */
export interface WaferBefore {
  /** the slots of the wafer that is meant, of a flow that parts by slot; null for any */
  slots: string | null;
  silicon: string;
  /** outermost first */
  front: string[];
  /** from the silicon outwards */
  back: string[];
  /** carrier, tape or frame that it is on; null when it is free */
  on: string | null;
  faceUp: FaceUp;
}

function filmWords({ addition: { film, thickness, coverage, pattern } }: FilmState): string {
  const lines = pattern?.kind === "lines" ? { width: pattern.lineWidth, direction: pattern.direction } : null;
  return [film.name, filmThicknessText(thickness.value), filmCutWords({ coverage, lines })].filter(Boolean).join(", ");
}

/** 'Glass carrier, Laser-release adhesive'; between two carriers each with its face. */
function bondWords(bond: BondState, { bonds }: WaferState): string {
  const words = `${bond.carrier.name}, ${bond.material.name}`;
  return bonds.length > 1 ? `${SIDE_NAMES[bondedFace(bond)]}: ${words}` : words;
}

/**
 * The wafer before the step at `index` (from 0), by the steps before it; of a flow that parts by slot that of the first slots that
 * take the step. Null when one of those leaves no silicon, so that there
 * is no wafer to speak of.
 */
export function waferBefore(flow: FlowInput, index: number): WaferBefore | null {
  let state: WaferState;
  let leg: FlowInput;
  try {
    const legs = legFlows(flow);
    leg = legs.find(({ steps }) => steps[index]?.skipped !== true) ?? flow;
    state = leg.steps
      .slice(0, index)
      .reduce((wafer, step, at) => applyStep(wafer, step, `steps[${at}]`), initialState(leg));
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
  return {
    slots: leg.leg ? slotsInWords(leg.leg.slots) : null,
    silicon: `${siliconText(state.silicon)}\u00A0µm`,
    front: state.front.map(filmWords).toReversed(),
    back: state.back.map(filmWords),
    faceUp: state.faceUp,
    on: state.bonds.length > 0 ? state.bonds.map((bond) => bondWords(bond, state)).join("; ") : state.mount,
  };
}
