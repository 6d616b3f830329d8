import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { formatMeasured } from "#app/lib/format-measured.ts";
import type { StressInUseRow } from "#app/schemas/film-stress.ts";

const minute = (iso: string) => `${iso.slice(0, 16).replace("T", " ")} UTC`;
/** Rows that are shown at once; more are unfolded. */
const SHOWN = 6;

/** Every stress that the film had in use, the newest first. */
export function StressInUse({ rows }: { rows: StressInUseRow[] }) {
  const more = rows.slice(SHOWN);
  return (
    <section aria-labelledby="in-use" className="mt-6">
      <h3 id="in-use" className="font-semibold">
        Stresses in use
      </h3>
      <Table rows={rows.slice(0, SHOWN)} caption="Stresses in use" />
      {more.length > 0 && (
        <details className="mt-2">
          <summary className="link w-fit cursor-pointer">{more.length} earlier</summary>
          <Table rows={more} caption="Earlier stresses in use" />
        </details>
      )}
    </section>
  );
}

function Table({ rows, caption }: { rows: StressInUseRow[]; caption: string }) {
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
      <table className="table">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            <th scope="col" className="num">
              Stress ± tolerance
            </th>
            <th scope="col">From</th>
            <th scope="col">To</th>
            <th scope="col">Source</th>
            <th scope="col">Put in by</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ id, stress, since, until, by }) => (
            <tr key={id}>
              <td className="num font-medium">{formatMeasured(stress, "stress", { unit: "MPa", sign: true })}</td>
              <td className="whitespace-nowrap">{minute(since)}</td>
              <td className="whitespace-nowrap">{until ? minute(until) : <b>in use</b>}</td>
              <td>
                <SourceMark kind={stress.source} />
                {stress.note && <span className="block text-label text-quiet">{stress.note}</span>}
              </td>
              <td>{by}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
