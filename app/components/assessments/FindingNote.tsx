import type { StepRow } from "#app/lib/assessment-steps.ts";

/** The worst finding of a step in a few words, and how many more there are. */
export function FindingNote({ step }: { step: StepRow }) {
  if (step.note === null) return null;
  return (
    <>
      {step.note}
      {step.more > 0 ? ` and ${step.more} more` : ""}
    </>
  );
}
