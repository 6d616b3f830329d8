import { useState } from "react";
import { beginHistory, note, standing, stateAfter, step } from "#app/lib/stack-history.ts";
import type { Direction } from "#app/lib/undo-key.ts";

/**
 * What has been done to a stack, with undo and redo. Text that is being typed into a field is noted once the field is left, everything
 * else at once.
 * @param said the stack as it is said now, as the JSON of its text
 */
export function useStackHistory(said: string) {
  const [history, setHistory] = useState(() => beginHistory(said));
  const [typing, setTyping] = useState(false);
  if (!typing && said !== standing(history)) setHistory(note(history, said));
  const now = note(history, said);
  return {
    /** whether text is being typed into a field */
    typing,
    /** whether a field holds text that has not been noted yet */
    unnoted: now !== history,
    undoTo: stateAfter(now, "undo"),
    redoTo: stateAfter(now, "redo"),
    type: () => setTyping(true),
    /** a field is left, or something is about to be done to the stack as a whole */
    settle: () => {
      setTyping(false);
      setHistory(now);
    },
    /** The state that a step leads to, which the caller puts into the form; null at the end of the way. */
    take: (direction: Direction): string | null => {
      setTyping(false);
      setHistory(step(now, direction));
      return stateAfter(now, direction);
    },
  };
}
