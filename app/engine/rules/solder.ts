import type { FilmInput } from "../flow/model.ts";
import { allFilms, type WaferState } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import type { Measured } from "../measured.ts";
import { earlierSteps } from "./other-steps.ts";

/** Temperature at which a film's solder melts; null when it has none, or none that is known. */
export function solderMelting(film: FilmInput): Measured | null {
  return film.solderMelting ?? (film.kind === "solder" ? film.temperatureLimit : null);
}

/** The film on the wafer whose solder melts first, with that temperature. */
export function firstToMelt(wafer: WaferState): { film: FilmInput; melting: Measured } | null {
  return allFilms(wafer).reduce<{ film: FilmInput; melting: Measured } | null>((first, { addition: { film } }) => {
    const melting = solderMelting(film);
    return melting && (!first || melting.value < first.melting.value) ? { film, melting } : first;
  }, null);
}

/** Whether the device side has bumps: stated, or there must be because solder was put on it or reflowed. */
export function hasBumps(steps: readonly StepState[], state: StepState): boolean {
  return (
    state.after.bumps !== null ||
    state.before.front.some(
      ({ addition: { film } }) => film.kind === "solder" || (film.solderMelting ?? null) !== null,
    ) ||
    earlierSteps(steps, state).some(({ step }) => step.kind === "reflow")
  );
}
