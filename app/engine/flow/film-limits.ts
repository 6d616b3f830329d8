import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { StressBounds } from "../laminate/bounded-stress.ts";
import { yieldShare } from "./film-entry.ts";
import type { FilmAddition } from "./model.ts";

/** Yield stress falls linearly to zero this far above 25 °C, K (common practice, no source; trend of Thouless 1993, from memory). */
const YIELD_FALLS_TO_ZERO_OVER = 600;

/** Yield stress of a metal film at a temperature (K), Pa: σ_y(25 °C)·(1 − (T − 25 °C)/600 K), never below zero. */
export function yieldStress(atRoom: number, temperature: number): number {
  return atRoom * Math.max(0, 1 - (temperature - ROOM_TEMPERATURE) / YIELD_FALLS_TO_ZERO_OVER);
}

/**
 * Notes the least and most mean stress, Pa, that a film carries at a temperature (K) as that of layer `at`; false for one that
 * stays elastic, which is left as it is.
 */
export function noteBounds(
  addition: FilmAddition,
  { temperature, metalHistory }: { temperature: number; metalHistory: boolean },
  bounds: StressBounds,
  at: number,
): boolean {
  const { film } = addition;
  if (film.kind === "polymer") {
    const soft = temperature >= (film.zeroStressTemperature?.value ?? Infinity);
    bounds.low[at] = 0;
    bounds.high[at] = soft ? 0 : Infinity;
    return true;
  }
  if (film.kind !== "metal" || film.yieldStress === null || !metalHistory) return false;
  const limit = yieldStress(film.yieldStress.value, temperature) * yieldShare(addition);
  bounds.low[at] = -limit;
  bounds.high[at] = limit;
  return true;
}
