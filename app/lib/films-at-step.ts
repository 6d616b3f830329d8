import { EngineInputError } from "#app/engine/errors.ts";
import { legFlows } from "#app/engine/flow/legs.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { applyStep, initialState, type FilmState } from "#app/engine/flow/state.ts";

const names = (films: FilmState[]) => films.map(({ addition }) => addition.film.name).join(", ");

/**
 * The films on a wafer once a step has been done, by name from the silicon outwards, for incidents that are counted by film stack.
 * @param leg of a flow that parts by slot, from 1; 0 where it does not
 * @param step counts from 1
 */
export function filmsAtStep(flow: FlowInput, leg: number, step: number): string {
  try {
    const taken = legFlows(flow)[Math.max(leg, 1) - 1] ?? flow;
    const state = taken.steps
      .slice(0, step)
      .reduce((wafer, each, at) => applyStep(wafer, each, `steps[${at}]`), initialState(taken));
    const sides = [
      state.front.length > 0 && `device side: ${names(state.front)}`,
      state.back.length > 0 && `back side: ${names(state.back)}`,
    ].filter(Boolean);
    return sides.length > 0 ? sides.join("; ") : "no film";
  } catch (error) {
    if (error instanceof EngineInputError) return "not known";
    throw error;
  }
}
