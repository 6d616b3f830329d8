import type { TrialHead } from "#app/schemas/trial.ts";

/** Which slots something is tried for, of a flow that parts by slot. */
export function TrialLeg({ head: { leg } }: { head: Pick<TrialHead, "leg"> }) {
  if (!leg) return null;
  return (
    <p className="mb-3">
      Tried for <strong>{leg.slots}</strong>. What it does to the other slots is not asked here.
    </p>
  );
}
