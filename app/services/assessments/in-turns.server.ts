import { setImmediate as othersTurn } from "node:timers/promises";

/** Longest that a search keeps others waiting, ms. */
const TURN = 20;

/** Runs a search of the engine to its end, and lets other requests have their turn in between. */
export async function inTurns<Result>(search: Generator<unknown, Result>): Promise<Result> {
  let since = performance.now();
  for (;;) {
    const next = search.next();
    if (next.done) return next.value;
    if (performance.now() - since < TURN) continue;
    await othersTurn();
    since = performance.now();
  }
}
