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

/** A field that at least one of the two has changed, with what each of them makes of it. */
export interface ConflictRow {
  label: string;
  /** as it was when this person opened the stack; null where that is not known */
  opened: string | null;
  mine: string;
  theirs: string;
  by: "you" | "them" | "both";
}

/** Fields that both have changed come first: only they need a decision. */
const ORDER = ["both", "them", "you"];

/**
 * What the two have made of a stack, field by field.
 * @param opened the stack when this person opened it; null where that is not known, as without scripts: then the two are held
 * against each other
 */
export function conflictRows(
  { mine, theirs, opened }: { mine: StackText; theirs: StackText; opened: StackText | null },
  names: StackNames,
): ConflictRow[] {
  if (!opened)
    return stackDifferences(theirs, mine, names).map(({ label, before, after }) => ({
      label,
      opened: null,
      mine: after,
      theirs: before,
      by: "both",
    }));
  const [own, other] = [mine, theirs].map(
    (after) => new Map(stackDifferences(opened, after, names).map((difference) => [difference.key, difference])),
  );
  const keys = [...new Set([...(other?.keys() ?? []), ...(own?.keys() ?? [])])];
  return keys
    .flatMap((key): ConflictRow[] => {
      const [by, against] = [own?.get(key), other?.get(key)];
      const { label, before } = by ?? against ?? { label: key, before: "" };
      // Both made the same change: nothing to decide.
      if (by && against && by.after === against.after) return [];
      return [
        {
          label,
          opened: before,
          mine: by?.after ?? before,
          theirs: against?.after ?? before,
          by: by && against ? "both" : by ? "you" : "them",
        },
      ];
    })
    .toSorted((one, next) => ORDER.indexOf(one.by) - ORDER.indexOf(next.by));
}
