import type { RevisionKind } from "#app/schemas/flow-plan.ts";

interface Revision {
  /** from 1, ascending */
  number: number;
  kind: RevisionKind;
}

/** Where a flow stands in its history, by the numbers of revisions that hold a plan. */
export interface HistoryPosition {
  /** the revision whose plan is in force */
  now: number | null;
  /** the one before it, which undo puts back */
  before: number | null;
  /** the one that was last taken back, which redo puts back */
  after: number | null;
}

/**
 * Where a flow stands: undo and redo are themselves only noted, so the position follows from going through all of them. A new
 * change after an undo leaves nothing to be done again, but what was taken back is still in the list.
 */
export function historyPosition(revisions: readonly Revision[]): HistoryPosition {
  const past: number[] = [];
  let future: number[] = [];
  for (const { number, kind } of revisions) {
    const moved = kind === "undo" ? past.pop() : kind === "redo" ? future.pop() : number;
    if (moved === undefined) continue;
    if (kind === "undo") future.push(moved);
    else past.push(moved);
    if (kind === "start" || kind === "edit") future = [];
  }
  return { now: past.at(-1) ?? null, before: past.at(-2) ?? null, after: future.at(-1) ?? null };
}
