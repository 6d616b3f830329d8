import type { IncidentRatesView } from "#app/schemas/incident-rates.ts";
import { Rate } from "./RateTable.tsx";

const SAYS = {
  "for it": "for it: below it more break",
  "against it": "against it: below it fewer break",
  "too low": "too low: from it on, too, more break than of all",
  "too few to say": "too few to say",
};

/** On a phone it stands under the limit. */
const WIDE = "max-tablet:hidden print:table-cell";
const weightOf = (speaks: keyof typeof SAYS) => (speaks === "too few to say" ? "text-quiet" : "font-semibold");

/** The site's limits of thickness beside what has happened on both sides of them. */
export function LimitTable({ limits, rates: { all } }: Pick<IncidentRatesView, "limits" | "rates">) {
  if (limits.length === 0) return null;
  return (
    <div
      className="mt-6 overflow-x-auto print:break-inside-avoid"
      tabIndex={0}
      role="region"
      aria-label="Limits against what happened"
    >
      <table className="table">
        <caption className="pb-2 text-left font-semibold">Limits of thickness against what happened</caption>
        <thead>
          <tr>
            <th scope="col">Limit</th>
            <th scope="col" className="num">
              From it on
            </th>
            <th scope="col" className="num">
              Below it
            </th>
            <th scope="col" className={WIDE}>
              What it says
            </th>
          </tr>
        </thead>
        <tbody>
          {limits.map(({ key, title, value, from, below, speaks }) => (
            <tr key={key}>
              <th scope="row" className="min-w-36 text-left font-normal">
                {title} {value}
                <span className={`block tablet:hidden print:hidden ${weightOf(speaks)}`}>{SAYS[speaks]}</span>
              </th>
              {[from, below].map((row) => (
                <td key={row.name} className="num">
                  {row.through === 0 && row.incidents === 0 ? (
                    <span className="text-quiet">no wafer</span>
                  ) : (
                    <>
                      <Rate row={row} all={all} />
                      <span className="block text-label text-quiet">{`${row.brokenOfThrough} of ${row.through}`}</span>
                    </>
                  )}
                </td>
              ))}
              <td className={`${WIDE} ${weightOf(speaks)}`}>{SAYS[speaks]}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
