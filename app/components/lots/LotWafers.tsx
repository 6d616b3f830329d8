import { Link } from "react-router";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import { withoutUnit } from "#app/lib/format-measured.ts";
import { COVERAGE } from "#app/lib/scan-answer.ts";
import { WAFER_FIGURES, type WaferFigure, type WaferFigureName } from "#app/lib/wafer-figures.ts";
import type { LotWafer } from "#app/schemas/lot-view.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

const HEADS: Record<WaferFigureName, { head: string; unit: string; decimals: number; sign?: boolean }> = {
  bow: { head: "Bow", unit: "µm", decimals: 1, sign: true },
  warp: { head: "Warp", unit: "µm", decimals: 1 },
  thickness: { head: "Thickness", unit: "µm", decimals: 1 },
  "thickness variation": { head: "TTV", unit: "µm", decimals: 2 },
  stress: { head: "Film stress", unit: "MPa", decimals: 1, sign: true },
};

/**
 * The wafers of a lot by slot, the newest of each figure. How a column was measured stands once below; where its wafers were measured
 * in different ways it stands with each, because only like is compared with like.
 */
export function LotWafers({ wafers }: { wafers: readonly LotWafer[] }) {
  const ways = Object.fromEntries(WAFER_FIGURES.map((name) => [name, wayOf(wafers, name)])) as Record<
    WaferFigureName,
    string | null
  >;
  return (
    <>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Wafers of the lot">
        <table className="table border-t border-ink">
          <caption className="sr-only">Wafers of the lot by slot, the newest of each figure</caption>
          <thead>
            <tr>
              <th scope="col" className="num">
                Slot
              </th>
              <th scope="col">Wafer</th>
              <th scope="col">Stands</th>
              {WAFER_FIGURES.map((name) => (
                <th key={name} scope="col" className="num min-w-24">
                  {HEADS[name].head}
                  <span className="block">
                    <OwnHead unit={HEADS[name].unit} />
                  </span>
                </th>
              ))}
              <th scope="col" className="num">
                Scans
              </th>
            </tr>
          </thead>
          <tbody>
            {wafers.map(({ id, slot, name, status, figures, scans, waiting }) => (
              <tr key={id}>
                <td className="num">{slot ?? <span className="text-quiet">–</span>}</td>
                <th scope="row" className="min-w-24 font-normal">
                  <Link to={`/wafers/${id}`} className="link wrap-anywhere">
                    {name}
                  </Link>
                </th>
                <td className={status === "broken" || status === "scrapped" ? "font-semibold" : ""}>{status}</td>
                {WAFER_FIGURES.map((figure) => (
                  <td key={figure} className="num">
                    <Figure figure={figures[figure]} name={figure} told={ways[figure] !== null} />
                  </td>
                ))}
                <td className="num">
                  {scans}
                  {waiting > 0 && <span className="block text-label text-quiet">{waiting} waiting</span>}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <dl className="mt-2 text-label">
        {WAFER_FIGURES.filter((name) => ways[name]).map((name) => (
          <div key={name} className="flex flex-wrap gap-x-2">
            <dt>{HEADS[name].head}</dt>
            <dd className="text-quiet">{ways[name]}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-1 text-label text-quiet">
        Bow as its tool gives it: with the device side up, centre above the reference plane is positive. Uncertainties
        are expanded, k = 2; where no ± stands, the tool gave none.
      </p>
    </>
  );
}

/** How and when all wafers of a column were measured; null when they were not measured alike, nothing when none was. */
function wayOf(wafers: readonly LotWafer[], name: WaferFigureName): string | null {
  const ways = new Set(wafers.flatMap(({ figures }) => (figures[name] ? [way(figures[name])] : [])));
  if (ways.size > 1) return null;
  const [only = ""] = ways;
  return only;
}

const way = ({ how, on }: WaferFigure) => [how, on].filter((text) => text !== "").join(", ");

function Figure({ figure, name, told }: { figure: WaferFigure | undefined; name: WaferFigureName; told: boolean }) {
  if (!figure) return <span className="text-quiet">–</span>;
  const { unit, sign, decimals } = HEADS[name];
  const dimension = name === "stress" ? "stress" : "length";
  const text =
    figure.uncertainty === null
      ? formatQuantity(figure.value, dimension, { unit, sign, decimals })
      : formatWithUncertainty(figure.value, COVERAGE * figure.uncertainty, dimension, { unit, sign });
  return (
    <>
      <span className="whitespace-nowrap">
        <OwnFigure unit={unit}>{withoutUnit(text)}</OwnFigure>
      </span>
      {!told && <span className="block text-label text-quiet">{way(figure)}</span>}
    </>
  );
}
