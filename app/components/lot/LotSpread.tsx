import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { LotDots } from "#app/components/drawings/LotDots.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { spreadRows, type SpreadRow } from "#app/lib/lot-spread.ts";
import { SLOTS } from "#app/lib/cassette.ts";
import { spreadSentences } from "#app/lib/lot-words.ts";
import type { LotRecord } from "#app/schemas/lot.ts";

interface Props {
  lot: Pick<LotRecord, "answers" | "thickness">;
  /** the table opens on demand, where more stands below it */
  folded?: boolean;
}

/** How many wafers of a lot miss a limit, and each by its slot. Nothing where only the mean is known. */
export function LotSpread({ lot, folded = false }: Props) {
  if (lot.answers.length === 0) return null;
  const rows = spreadRows(lot);
  const [said = "", ...more] = spreadSentences(lot.answers);
  return (
    <section className="border-t border-ink" aria-labelledby="wafers">
      <div className="p-4 tablet:px-6">
        <h2 id="wafers" className="text-lead font-medium">
          {noBreak([said, ...more].join(" "))}
        </h2>
        <p className="mt-1 text-quiet">
          Each wafer by itself, at the step where it comes nearest to what the tool takes, tolerances left out.
        </p>
        <div className="mt-3 overflow-x-auto" tabIndex={0} role="region" aria-label="Wafers by slot, drawn">
          <LotDots
            dots={rows}
            slots={SLOTS}
            label={`Warp of each wafer as a share of its tightest limit, by slot. ${said}`}
          />
        </div>
        <p className="mt-2 text-label text-quiet">
          Warp as a share of the limit. Dot: clear. Ring: near the limit. Square: beyond it. Triangle: beyond the
          drawing.
        </p>
      </div>
      {folded ? (
        <details className="border-t border-line">
          <summary className="link w-fit cursor-pointer px-4 py-3 tablet:px-6">Each wafer by its slot</summary>
          <Table rows={rows} />
        </details>
      ) : (
        <Table rows={rows} />
      )}
    </section>
  );
}

function Table({ rows }: { rows: SpreadRow[] }) {
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Wafers by slot">
      <table className="table border-t border-ink">
        <caption className="sr-only">Wafers by slot</caption>
        <thead>
          <tr>
            <th scope="col" className="num">
              Slot
            </th>
            <th scope="col" className="num">
              Bow in
            </th>
            <th scope="col" className="num max-tablet:hidden print:table-cell">
              Thickness in
            </th>
            <th scope="col">Tightest at step</th>
            <th scope="col" className="max-tablet:hidden print:table-cell">
              Lies
            </th>
            <th scope="col" className="num max-tablet:hidden print:table-cell">
              Tool takes
            </th>
            <th scope="col">Finding</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row key={row.slot} row={row} />
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Row({
  row: { slot, bow, thickness, step, lies, limit, shareText, share, outcome, reason },
}: {
  row: SpreadRow;
}) {
  return (
    <tr>
      <th scope="row" className="num font-normal">
        {slot}
      </th>
      <td className="num whitespace-nowrap">{bow}</td>
      <td className="num max-tablet:hidden print:table-cell">{thickness}</td>
      <td>{step === null ? "–" : noBreak(step)}</td>
      <td className="max-tablet:hidden print:table-cell">{lies}</td>
      <td className="num max-tablet:hidden print:table-cell">{limit}</td>
      <td>
        <FindingTag outcome={outcome}>{share === null ? undefined : `${shareText} of limit`}</FindingTag>
        {reason === null ? null : <span className="block text-label text-quiet">{noBreak(reason)}</span>}
      </td>
    </tr>
  );
}
