import type { Fault } from "#app/lib/scan-reading/reading.ts";

interface Props {
  faults: readonly Fault[];
  footerLines: number;
}

/** What of a file could not be used, by cause, with the first places. */
export function FileFaults({ faults, footerLines }: Props) {
  if (faults.length === 0 && footerLines === 0) return null;
  return (
    <ul>
      {faults.map(({ cause, count, places }) => (
        <li key={cause} className="border-t border-line py-1 first:border-0">
          <b className="font-semibold">{`${count} × ${cause}`}</b>
          {": "}
          {places.map(({ row, column, text }, n) => (
            <span key={n} className="text-quiet">
              {n > 0 && "; "}
              {row === 0 ? "elsewhere" : `row ${row}`}
              {column === null ? "" : `, column ${column + 1}`}
              {text === "" ? "" : ` “${text}”`}
            </span>
          ))}
          {count > places.length && <span className="text-quiet">{`; the first ${places.length} are listed`}</span>}
        </li>
      ))}
      {footerLines > 0 && (
        <li className="border-t border-line py-1 text-quiet first:border-0">
          {footerLines === 1 ? "1 line of words below the data" : `${footerLines} lines of words below the data`}
        </li>
      )}
    </ul>
  );
}
