import type { SubmissionResult } from "@conform-to/react";
import type { ReactNode } from "react";

interface Props {
  label: string;
  /** names of the fields in it, as the form sends them */
  holds: readonly string[];
  /** something of it is given already */
  given: boolean;
  lastResult: SubmissionResult<string[]> | null | undefined;
  children: ReactNode;
}

/** Fields that few records have, folded away until something of them is given or needs a look. */
export function OptionalFields({ label, holds, given, lastResult, children }: Props) {
  const faults = Object.keys(lastResult?.error ?? {});
  const faulty = faults.some((fault) => holds.some((name) => fault === name || fault.startsWith(`${name}.`)));
  return (
    <details className="border-t border-line pt-3" open={given || faulty}>
      <summary className="cursor-pointer font-semibold">
        {label}
        <span className="ml-2 font-normal text-quiet">Blank is missing: a rule that needs it says so.</span>
      </summary>
      <div className="mt-3 space-y-4">{children}</div>
    </details>
  );
}
