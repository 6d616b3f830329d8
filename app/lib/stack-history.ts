import type { Direction } from "./undo-key.ts";

/** A stack at each moment since it was opened, as the JSON of its text, with the way back; `at` is the one that stands. */
export interface StackHistory {
  states: readonly string[];
  at: number;
}

/** So many steps can be taken back. */
const DEPTH = 200;

export const beginHistory = (said: string): StackHistory => ({ states: [said], at: 0 });

/** The state that stands. */
export const standing = ({ states, at }: StackHistory): string => states[at] ?? "";

/** The state that a step would lead to; null at the end of the way. */
export function stateAfter({ states, at }: StackHistory, direction: Direction): string | null {
  return states[direction === "undo" ? at - 1 : at + 1] ?? null;
}

/** Notes a new state; what had been taken back is gone with it. The very same history while nothing has changed. */
export function note(history: StackHistory, said: string): StackHistory {
  if (said === standing(history)) return history;
  const states = [...history.states.slice(0, history.at + 1), said].slice(-DEPTH - 1);
  return { states, at: states.length - 1 };
}

/** One step back or on; the very same history at its end. */
export function step(history: StackHistory, direction: Direction): StackHistory {
  if (stateAfter(history, direction) === null) return history;
  return { ...history, at: history.at + (direction === "undo" ? -1 : 1) };
}
