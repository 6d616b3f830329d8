import { Link } from "react-router";
import { formatWithUncertainty } from "#app/engine/units/format.ts";
import { angleText } from "#app/lib/angle-text.ts";
import { withoutUnit } from "#app/lib/format-measured.ts";
import type { ScanLine } from "#app/schemas/wafer-page.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

/** The scans that the figures of a wafer come from. */
export function ScanLines({ scans }: { scans: ScanLine[] }) {
  return (
    <section aria-labelledby="scans">
      <h2 id="scans" className="font-semibold">
        Scans
      </h2>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Scans of this film">
        <table className="table">
          <caption className="sr-only">Scans of this film</caption>
          <thead>
            <tr>
              <th scope="col">Scan</th>
              <th scope="col" className="num">
                Azimuth
              </th>
              <th scope="col" className="num">
                Change<span className="block font-normal text-quiet">1/km, k = 2</span>
              </th>
              <th scope="col" className="num">
                Stress
                <span className="block font-normal text-quiet">
                  <OwnHead unit="MPa, k = 2" />
                </span>
              </th>
              <th scope="col" className="max-tablet:hidden print:table-cell">
                Instrument
              </th>
              <th scope="col" className="max-tablet:hidden print:table-cell">
                Uploaded
              </th>
            </tr>
          </thead>
          <tbody>
            {scans.map(({ id, label, azimuth, change, stress, instrument, createdAt, createdBy }) => (
              <tr key={id}>
                <th scope="row" className="min-w-44 font-normal wrap-anywhere">
                  <Link to={`/scans/${id}`} className="link">
                    {label}
                  </Link>
                </th>
                <td className="num">{azimuth === null ? "not given" : angleText(azimuth)}</td>
                <td className="num">
                  {withoutUnit(
                    formatWithUncertainty(change.value, change.uncertainty, "curvature", { unit: "1/km", sign: true }),
                  )}
                </td>
                <td className="num">
                  <OwnFigure unit="MPa">
                    {withoutUnit(
                      formatWithUncertainty(stress.value, stress.uncertainty, "stress", { unit: "MPa", sign: true }),
                    )}
                  </OwnFigure>
                </td>
                <td className="max-tablet:hidden print:table-cell">
                  {instrument ?? <span className="text-quiet">not named</span>}
                </td>
                <td className="max-tablet:hidden print:table-cell">
                  {createdAt.slice(0, 10)}, {createdBy}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <p className="text-label text-quiet">
        Each line by itself, as it was stored: its ± holds the scatter of the points and the tolerances, not the
        repeatability of the instrument.
      </p>
    </section>
  );
}
