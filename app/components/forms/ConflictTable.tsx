import type { ConflictRow } from "#app/lib/record-conflict.ts";

/** Two versions beside each other, where what was before them is not known. */
export function ConflictTable({ rows, by }: { rows: readonly ConflictRow[]; by: string }) {
  return (
    <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label="Where the two differ">
      <table className="table border-t border-ink">
        <caption className="sr-only">Where the two differ</caption>
        <thead>
          <tr>
            <th scope="col">Field</th>
            <th scope="col">Yours</th>
            <th scope="col">Saved by {by}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ label, mine, theirs }) => (
            <tr key={label}>
              <th scope="row">{label}</th>
              <td>{mine}</td>
              <td>{theirs}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
