import { Link } from "react-router";
import { ConflictTable } from "#app/components/forms/ConflictTable.tsx";
import { LEAVE } from "#app/components/forms/UnsavedGuard.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { FlowConflict } from "#app/schemas/flow-plan.ts";
import { TheirChanges } from "./FlowConflictNotice.tsx";

interface Props {
  conflict: FlowConflict;
  /** takes their state of the flow, leaving what is typed here */
  theirs: string;
  onTakeTheirs: () => void;
}

/** Somebody else changed the flow while this step was being typed: what they did, field by field, and whose is to stand. */
export function StepConflict({ conflict, theirs, onTakeTheirs }: Props) {
  const { by, at, changes, step } = conflict;
  return (
    <Notice
      kind="error"
      title={`${by} changed this flow at ${at.slice(0, 16).replace("T", " ")} UTC, after you had opened it`}
    >
      <TheirChanges changes={changes} />
      {step === "removed" && (
        <p className="mt-2">This step is no longer in the flow. Keep yours to put it back where it was.</p>
      )}
      {step?.length === 0 && <p className="mt-2">The step as you typed it and as it is saved are the same.</p>}
      {Array.isArray(step) && step.length > 0 && <ConflictTable rows={step} saved={`As it is saved, last by ${by}`} />}
      <p className="mt-2">Nothing is saved yet, and nothing that you typed is lost.</p>
      <div className="mt-3 flex flex-wrap gap-2">
        <button type="submit" className="btn">
          Keep mine
        </button>
        <Link to={theirs} state={LEAVE} className="btn" onClick={onTakeTheirs}>
          Take theirs
        </Link>
      </div>
    </Notice>
  );
}
