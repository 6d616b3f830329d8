import { Link } from "react-router";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { FlowConflict } from "#app/schemas/flow-plan.ts";

interface Props {
  conflict: FlowConflict;
  flowId: string;
  /** the change that was not made, to be posted again */
  again: string | null;
  /** id of the form that changes steps */
  form: string;
}

/** Two people changed the flow at once: what the other did, and whether one's own change is still wanted. */
export function FlowConflictNotice({ conflict, flowId, again, form }: Props) {
  return (
    <Notice
      kind="error"
      title={`${conflict.by} changed this flow at ${conflict.at.slice(0, 16).replace("T", " ")} UTC, after you had opened it`}
    >
      <TheirChanges changes={conflict.changes} />
      <p className="mt-2">Your change is not made yet. The steps below are as they are now.</p>
      <div className="mt-3 flex flex-wrap gap-2">
        {again !== null && (
          <button type="submit" form={form} name="change" value={again} className="btn">
            Keep mine: do it all the same
          </button>
        )}
        <Link to={`/flows/${flowId}`} className="btn">
          Take theirs
        </Link>
      </div>
    </Notice>
  );
}

/** What somebody else did in the meantime, in order. */
export function TheirChanges({ changes }: { changes: string[] }) {
  if (changes.length === 0) return null;
  return (
    <ul className="mt-1 list-disc pl-5">
      {changes.map((words, index) => (
        <li key={index}>{words}</li>
      ))}
    </ul>
  );
}
