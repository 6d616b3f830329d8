import type { RateRow } from "#app/lib/incident-rates.ts";
import { against, rateWords } from "#app/lib/rate-words.ts";

interface Props {
  caption: string;
  /** what the rows are */
  head: string;
  rows: readonly RateRow[];
  all: RateRow;
}

/** Left out on a phone, where the rate stands with the counts that it is of. */
const WIDE = "max-tablet:hidden print:table-cell";

const AGAINST = { above: "above the rest", below: "below the rest" };

/** Counts and rates of one way to part the steps. */
export function RateTable({ caption, head, rows, all }: Props) {
  return (
    <div className="mt-6 overflow-x-auto print:break-inside-avoid" tabIndex={0} role="region" aria-label={caption}>
      <table className="table">
        <caption className="pb-2 text-left font-semibold">{caption}</caption>
        <thead>
          <tr>
            <th scope="col">{head}</th>
            {["Incidents", "Affected", "Broken", "Went through"].map((counted) => (
              <th key={counted} scope="col" className={`num ${WIDE}`}>
                {counted}
              </th>
            ))}
            <th scope="col" className="num">
              Broken of these
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.name}>
              <th scope="row" className="text-left font-normal wrap-anywhere">
                {row.name}
              </th>
              <td className={`num ${WIDE}`}>{row.incidents}</td>
              <td className={`num ${WIDE}`}>{row.affected}</td>
              <td className={`num ${WIDE}`}>{row.broken}</td>
              <td className={`num ${WIDE}`}>
                {row.through > 0 ? row.through : "–"}
                {row.uncounted > 0 && (
                  <span className="block text-label text-quiet">
                    {row.uncounted === 1 ? "1 incident" : `${row.uncounted} incidents`} not counted
                  </span>
                )}
              </td>
              <td className="num">
                <Rate row={row} all={all} />
                <span className="block text-label text-quiet tablet:hidden print:hidden">
                  {row.through > 0 ? `${row.brokenOfThrough} of ${row.through}` : `${row.incidents} reported`}
                </span>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** A rate with its interval, and whether it stands out from all. */
export function Rate({ row, all }: { row: RateRow; all: RateRow }) {
  const words = rateWords(row);
  const stands = against(row, all);
  if (words === null) return <span className="text-quiet">not counted</span>;
  return (
    <>
      <span className={stands === "above" ? "font-semibold text-stop" : ""}>{words}</span>
      {stands && <span className="block text-label">{AGAINST[stands]}</span>}
    </>
  );
}
