import type { PlaceState } from "./model.ts";

/** How a place of a sweep lies, in words. */
export const STATE_WORDS: Record<PlaceState, string> = {
  "0": "lies free",
  "1": "curled about one axis",
  "2": "none",
  "3": "refused by the engine",
};

/** How the nth place of a map lies. */
export function placeState(states: string, n: number): PlaceState {
  const state = states.charAt(n);
  return state === "1" || state === "2" || state === "3" ? state : "0";
}
