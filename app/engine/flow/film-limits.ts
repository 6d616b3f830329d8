import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { StressBound } from "../laminate/bounded-stress.ts";
import type { PlacedLayer } from "../laminate/placed-layers.ts";
import { yieldShare } from "./film-entry.ts";
import type { FilmAddition } from "./model.ts";

/** Yield stress falls linearly to zero this far above 25 °C, K (common practice, no source; trend of Thouless 1993, from memory). */
const YIELD_FALLS_TO_ZERO_OVER = 600;

/** Yield stress of a metal film at a temperature (K), Pa: σ_y(25 °C)·(1 − (T − 25 °C)/600 K), never below zero. */
export function yieldStress(atRoom: number, temperature: number): number {
  return atRoom * Math.max(0, 1 - (temperature - ROOM_TEMPERATURE) / YIELD_FALLS_TO_ZERO_OVER);
}

/** Least and most mean stress that a film carries at a temperature (K), Pa; null for one that stays elastic. */
export function stressBound(
  addition: FilmAddition,
  layer: PlacedLayer,
  temperature: number,
  metalHistory: boolean,
): StressBound | null {
  const { film } = addition;
  if (film.kind === "polymer") {
    const soft = temperature >= (film.zeroStressTemperature?.value ?? Infinity);
    return { layer, low: 0, high: soft ? 0 : Infinity };
  }
  if (film.kind !== "metal" || film.yieldStress === null || !metalHistory) return null;
  const limit = yieldStress(film.yieldStress.value, temperature) * yieldShare(addition);
  return { layer, low: -limit, high: limit };
}
