import { useEffect, useRef } from "react";
import { Link } from "react-router";
import { Notice } from "#app/components/ui/Notice.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { conflictRows, type ConflictRow, type StackConflict as Conflict } from "#app/lib/stack-conflict.ts";
import type { StackNames } from "#app/lib/stack-differences.ts";
import type { StackText } from "#app/lib/stack-text.ts";

interface Props {
  conflict: Conflict;
  mine: StackText;
  /** the stack as it was opened; null where that is not known */
  opened: StackText | null;
  names: StackNames;
  /** where the stack as it is saved now is shown */
  address: string;
  onTakeTheirs: () => void;
}

/** Somebody else saved the stack while it was being changed here: what each has made of it, field by field, and whose is to stand. */
export function StackConflict({ conflict, mine, opened, names, address, onTakeTheirs }: Props) {
  const { by, at, theirs } = conflict;
  const inBrowser = useInBrowser();
  const top = useRef<HTMLDivElement>(null);
  // Whoever pressed 'save' may be anywhere on a long page.
  useEffect(() => top.current?.focus(), [conflict]);
  const rows = conflictRows({ mine, theirs, opened: inBrowser ? opened : null }, names);
  return (
    <div ref={top} tabIndex={-1}>
      <Notice
        kind="error"
        title={`${by} saved this stack at ${at.slice(0, 16).replace("T", " ")} UTC, after you had opened it`}
      >
        {rows.length === 0 ? (
          <p>Both of you have made the same of it.</p>
        ) : (
          <>
            <p>{summary(rows, by)}</p>
            <ConflictTable rows={rows} by={by} />
          </>
        )}
        <p className="mt-2">Nothing is saved yet, and nothing that you typed is lost.</p>
        <div className="mt-3 flex flex-wrap gap-2">
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

function summary(rows: readonly ConflictRow[], by: string): string {
  const both = rows.filter((row) => row.opened !== null && row.by === "both").length;
  const theirs = rows.filter((row) => row.by === "them").length;
  if (rows.some(({ opened }) => opened === null)) return "Where the two differ:";
  const fields = (count: number) => (count === 1 ? "one field" : `${count} fields`);
  if (both > 0) return `You and ${by} both changed ${fields(both)}.`;
  return theirs > 0 ? `${by} changed ${fields(theirs)} that you did not.` : "Only you have changed something.";
}

const WHO = { both: "both of you", them: "they did", you: "you did" };

function ConflictTable({ rows, by }: { rows: readonly ConflictRow[]; by: string }) {
  const known = rows.some(({ opened }) => opened !== null);
  return (
    <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label="Where the two differ">
      <table className="table border-t border-ink">
        <caption className="sr-only">Where the two differ</caption>
        <thead>
          <tr>
            <th scope="col">Field</th>
            {known && <th scope="col">Who changed it</th>}
            {known && <th scope="col">As you opened it</th>}
            <th scope="col">Yours</th>
            <th scope="col">Saved by {by}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ label, opened, mine, theirs, by: who }) => (
            <tr key={label}>
              <th scope="row" className={who === "both" ? "font-semibold" : "font-normal"}>
                {label}
              </th>
              {known && <td className={who === "both" ? "font-semibold" : undefined}>{WHO[who]}</td>}
              {known && <td className="text-quiet">{opened}</td>}
              <td className={who === "them" ? "text-quiet" : undefined}>{mine}</td>
              <td className={who === "you" ? "text-quiet" : undefined}>{theirs}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
