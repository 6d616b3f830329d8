import type { ConflictRow } from "./record-conflict.ts";
import { stackDifferences, type StackNames } from "./stack-differences.ts";
import type { StackText } from "./stack-text.ts";

/** Somebody else saved a stack after this person had opened it. */
export interface StackConflict {
  by: string;
  /** ISO 8601 */
  at: string;
  /** of what is saved now */
  version: number;
  theirs: StackText;
}

/** Where two versions of a stack differ when nobody knows any more what it was before, as without scripts. */
export function conflictRows(mine: StackText, theirs: StackText, names: StackNames): ConflictRow[] {
  return stackDifferences(theirs, mine, names).map(({ label, before, after }) => ({
    label,
    mine: after,
    theirs: before,
  }));
}
