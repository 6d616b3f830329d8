import type { IncidentRates, RateRow } from "#app/lib/incident-rates.ts";
import { against } from "#app/lib/rate-words.ts";
import { Rate } from "./RateTable.tsx";

/** Breakage over silicon thickness and what holds the wafer; what stands out says so in words and weight, not in colour alone. */
export function BreakageMap({ map, all }: { map: IncidentRates["map"]; all: RateRow }) {
  if (map.rows.length === 0) return null;
  return (
    <div className="mt-6 overflow-x-auto print:break-inside-avoid" tabIndex={0} role="region" aria-label="Breakage map">
      <table className="table">
        <caption className="pb-2 text-left font-semibold">Breakage over silicon thickness and support</caption>
        <thead>
          <tr>
            <th scope="col">Silicon</th>
            {map.supports.map((support) => (
              <th key={support} scope="col" className="num">
                {support}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {map.rows.map(({ band, cells }) => (
            <tr key={band}>
              <th scope="row" className="text-left font-normal whitespace-nowrap">
                {band}
              </th>
              {cells.map((cell, index) => (
                <td
                  key={map.supports[index]}
                  className={`num align-top ${cell && against(cell, all) === "above" ? "outline-2 -outline-offset-2 outline-stop" : ""}`}
                >
                  {cell ? (
                    <>
                      <Rate row={cell} all={all} />
                      <span className="block text-label text-quiet">
                        {cell.through > 0 ? `${cell.brokenOfThrough} of ${cell.through}` : `${cell.incidents} reported`}
                      </span>
                    </>
                  ) : (
                    <span className="text-quiet">no wafer</span>
                  )}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
