import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { ComparedStep, ComparisonRow } from "#app/lib/result-comparison.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

interface Props {
  rows: readonly ComparisonRow[];
  /** heads of the two halves, short */
  before: string;
  after: string;
  caption: string;
}

/** Steps of two results side by side: finding, support, silicon and warp of each, and how far the warp moves. */
export function ComparisonTable({ rows, before, after, caption }: Props) {
  return (
    <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
      <table className="table">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            <th scope="col">Step</th>
            <th scope="col">{before}</th>
            <th scope="col">{after}</th>
            <th scope="col" className="num">
              Warp, 25&nbsp;°C
              <span className="block">
                {before}, <OwnHead unit="µm" />
              </span>
            </th>
            <th scope="col" className="num">
              Warp, 25&nbsp;°C
              <span className="block">
                {after}, <OwnHead unit="µm" />
              </span>
            </th>
            <th scope="col" className="num">
              Difference
              <span className="block">
                <OwnHead unit="µm" />
              </span>
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row key={`${row.before?.number} ${row.after?.number}`} row={row} />
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Row({ row }: { row: ComparisonRow }) {
  const { before, after, difference, differs } = row;
  const step = after ?? before;
  const renamed = before && after && before.title !== after.title;
  return (
    <tr className={differs ? "" : "text-quiet"}>
      <th scope="row" className="min-w-44 font-normal">
        <span className={differs ? "font-medium text-ink" : ""}>
          {numbers(before, after)} {noBreak(step?.title ?? "")}
        </span>
        {renamed ? <span className="block text-label text-quiet">before: {noBreak(before.title)}</span> : null}
      </th>
      <td className="min-w-40">
        <Side step={before} other={after} />
      </td>
      <td className="min-w-40">
        <Side step={after} other={before} />
      </td>
      <td className="num">
        <OwnFigure unit="µm">{warpOf(before)}</OwnFigure>
      </td>
      <td className="num">
        <OwnFigure unit="µm">{warpOf(after)}</OwnFigure>
      </td>
      <td className={`num ${difference !== null && difference !== "0" ? "font-medium text-ink" : ""}`}>
        <OwnFigure unit="µm">{difference ?? "–"}</OwnFigure>
      </td>
    </tr>
  );
}

/** '7', or '7 and 8' where the step has moved. */
function numbers(before: ComparedStep | null, after: ComparedStep | null): string {
  if (before && after && before.number !== after.number) return `${before.number}, now ${after.number}:`;
  return `${(after ?? before)?.number ?? ""}`;
}

const warpOf = (step: ComparedStep | null) => (step ? step.warpText : "–");

function Side({ step, other }: { step: ComparedStep | null; other: ComparedStep | null }) {
  if (!step) return <span className="text-quiet">no such step</span>;
  const { outcome, note, required, needs, silicon, heldBy, liesAs } = step;
  const support = other && (other.required !== required || other.heldBy !== heldBy);
  return (
    <>
      <FindingTag outcome={outcome}>{note}</FindingTag>
      <span className="block text-label text-quiet">
        <span className={other && other.silicon !== silicon ? "font-semibold text-ink" : ""}>{silicon}&nbsp;µm</span>,{" "}
        <span className={support ? "font-semibold text-ink" : ""}>
          {heldBy.toLowerCase()}
          {needs === null ? "" : `, needs ${needs}`}
        </span>
        , {liesAs}
      </span>
    </>
  );
}
