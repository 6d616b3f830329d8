import type { ConflictRow } from "#app/lib/record-conflict.ts";

interface Props {
  rows: readonly ConflictRow[];
  /** head of the column of what is saved, with who saved it */
  saved: string;
}

/** Two versions beside each other, where what was before them is not known. */
export function ConflictTable({ rows, saved }: Props) {
  return (
    <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label="Where the two differ">
      <table className="table border-t border-ink">
        <caption className="sr-only">Where the two differ</caption>
        <thead>
          <tr>
            <th scope="col">Field</th>
            <th scope="col">Yours</th>
            <th scope="col">{saved}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ label, mine, theirs }) => (
            <tr key={label}>
              <th scope="row" className="font-normal">
                {label}
              </th>
              <td>{mine}</td>
              <td>{theirs}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
