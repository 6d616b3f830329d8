import type { DraftFault } from "#app/lib/stack-draft.ts";
import type { Status } from "./PanelStatus.tsx";
import { fieldId } from "./stack-fields.ts";
import type { useLiveEstimate } from "./use-live-estimate.ts";

/** Whether the figures are of what is typed, and else what they wait for. */
export function statusOf(
  faults: readonly DraftFault[],
  live: ReturnType<typeof useLiveEstimate>,
  goTo: (fault: DraftFault) => void,
): Status {
  const [first] = faults;
  if (first)
    return {
      kind: "waiting",
      what: first.what,
      more: faults.length - 1,
      fieldId: fieldId(first.field),
      goTo: () => goTo(first),
    };
  if (live.problem) return { kind: "problem", ...live.problem };
  return live.stale ? { kind: "asking" } : { kind: "current" };
}
