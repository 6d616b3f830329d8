import { useEffect, useRef, useState } from "react";
import { Link } from "react-router";
import { ConflictTable } from "#app/components/forms/ConflictTable.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { conflictRows, type StackConflict as Conflict } from "#app/lib/stack-conflict.ts";
import type { StackNames } from "#app/lib/stack-differences.ts";
import type { MergeChoices, MergeRow } from "#app/lib/stack-merge-rows.ts";
import { mergeOf, undecided, type StackMerge } from "#app/lib/stack-merge.ts";
import type { StackText } from "#app/lib/stack-text.ts";
import { MergeTable } from "./MergeTable.tsx";

interface Props {
  conflict: Conflict;
  mine: StackText;
  /** the stack as it was opened; null where that is not known */
  opened: StackText | null;
  names: StackNames;
  /** where the stack as it is saved now is shown */
  address: string;
  onTakeTheirs: () => void;
  /** @param save whether it is to be saved at once */
  onMerge: (merged: StackText, save: boolean) => void;
}

/** Somebody else saved the stack while it was being changed here: what each has made of it, field by field, and whose is to stand. */
export function StackConflict({ conflict, mine, opened, names, address, onTakeTheirs, onMerge }: Props) {
  const { by, at, theirs } = conflict;
  const inBrowser = useInBrowser();
  const top = useRef<HTMLDivElement>(null);
  // Whoever pressed 'save' may be anywhere on a long page.
  useEffect(() => top.current?.focus(), [conflict]);
  const merge = inBrowser && opened ? mergeOf({ opened, mine, theirs }, names) : null;
  const rows = merge ? [] : conflictRows(mine, theirs, names);
  return (
    <div ref={top} tabIndex={-1}>
      <Notice
        kind="error"
        title={`${by} saved this stack at ${at.slice(0, 16).replace("T", " ")} UTC, after you had opened it`}
      >
        {merge && merge.rows.length > 0 ? (
          <Merging merge={merge} by={by} onMerge={onMerge} />
        ) : rows.length > 0 ? (
          <>
            <p>Where the two differ:</p>
            <ConflictTable rows={rows} saved={`Saved by ${by}`} />
          </>
        ) : (
          <p>Both of you have made the same of it.</p>
        )}
        <p className="mt-3">Nothing is saved yet, and nothing that you typed is lost. Or decide it as a whole:</p>
        <div className="mt-2 flex flex-wrap gap-2">
          <button type="submit" className="btn">
            Keep mine
          </button>
          {inBrowser ? (
            <button type="button" className="btn" onClick={onTakeTheirs}>
              Take theirs
            </button>
          ) : (
            <Link to={address} className="btn">
              Take theirs
            </Link>
          )}
        </div>
        <p className="mt-2 text-label text-quiet">
          Keep mine saves the stack as you have it here, over theirs. Take theirs puts theirs into the fields
          {inBrowser && "; undo brings yours back"}.
        </p>
      </Notice>
    </div>
  );
}

interface MergingProps {
  merge: StackMerge;
  by: string;
  onMerge: Props["onMerge"];
}

function Merging({ merge, by, onMerge }: MergingProps) {
  const [choices, setChoices] = useState<MergeChoices>({});
  const [missed, setMissed] = useState(false);
  const part = useRef<HTMLDivElement>(null);
  const open = undecided(merge, choices);
  const put = (save: boolean) => {
    if (open.length === 0) return onMerge(merge.merge(choices), save);
    setMissed(true);
    part.current?.querySelector<HTMLElement>("[data-undecided]")?.focus();
  };
  return (
    <div ref={part}>
      <p>{summary(merge.rows, by)}</p>
      <MergeTable
        rows={merge.rows}
        by={by}
        choices={choices}
        onChoose={(key, whose) => setChoices({ ...choices, [key]: whose })}
      />
      <div className="mt-3 flex flex-wrap items-center gap-2">
        <button type="button" className="btn btn-primary" onClick={() => put(true)}>
          Save merged
        </button>
        <button type="button" className="btn" onClick={() => put(false)}>
          Put into the fields
        </button>
        <p role="status" className="text-label">
          {missed && open.length > 0 && `Choose yours or theirs first: ${open.map(({ label }) => label).join("; ")}.`}
        </p>
      </div>
      <p className="mt-2 text-label text-quiet">
        Save merged saves what is chosen on top of theirs. Put into the fields lets you look at it first; undo brings
        yours back.
      </p>
    </div>
  );
}

function summary(rows: readonly MergeRow[], by: string): string {
  const changed = (who: MergeRow["by"]) => rows.filter((row) => row.by === who).length;
  const fields = (count: number) => (count === 1 ? "one field" : `${count} fields`);
  const [both, theirs] = [changed("both"), changed("them")];
  if (both > 0)
    return `You and ${by} both changed ${fields(both)}: choose whose is to stand. The rest is put together.`;
  return theirs > 0
    ? `${by} changed ${fields(theirs)} that you did not. Nothing contradicts: it can be put together as it is.`
    : "Only you have changed something.";
}
