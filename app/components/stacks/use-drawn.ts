import { useDeferredValue, useMemo } from "react";
import type { StackDraft } from "#app/lib/stack-draft.ts";

/**
 * The draft as the drawings have it: it may be a key behind what is typed, never behind which films there are and where. A drawing that
 * still stood in the old order would take what is done to a film for another's.
 * @param order the same for as long as each film stays in its place
 */
export function useDrawn(draft: StackDraft, order: string): StackDraft {
  const now = useMemo(() => ({ draft, order }), [draft, order]);
  const late = useDeferredValue(now);
  return late.order === order ? late.draft : draft;
}
