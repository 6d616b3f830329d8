import type { SubmissionResult } from "@conform-to/react";
import { Notice } from "#app/components/ui/Notice.tsx";

/** What concerns the form as a whole: a conflict, a name that is taken, or that some fields need a look. */
export function FormHead({
  lastResult,
  stands = "Nothing is saved yet",
}: {
  lastResult: SubmissionResult<string[]> | null | undefined;
  /** what has been saved so far */
  stands?: string;
}) {
  if (!lastResult?.error) return null;
  const [problem] = lastResult.error[""] ?? [];
  const fields = Object.keys(lastResult.error).filter((name) => name !== "").length;
  if (!problem && fields === 0) return null;
  return (
    <Notice kind="error" title={problem ?? (fields === 1 ? "One field needs a look" : `${fields} fields need a look`)}>
      {stands}, and nothing that you typed is lost.
    </Notice>
  );
}
