import { formatWithUncertainty, formatQuantity } from "#app/engine/units/format.ts";
import { withoutUnit } from "#app/lib/format-measured.ts";
import type { Budget, BudgetRow, Expanded } from "#app/schemas/film-analysis.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

const WORDS: Record<string, string> = {
  "scatter of the scans": "Curvature, from the scatter of the points",
  "repeatability of the tool": "Curvature, from what the instrument repeats within",
  "curvature of the tool's reference": "Curvature of the instrument’s own reference",
  "height calibration": "Calibration of heights",
  "position calibration": "Calibration of positions",
  "substrate thickness": "Silicon thickness, by its tolerance",
  "biaxial modulus": "Silicon’s modulus, 1\u00A0% taken",
  "film thickness": "Film thickness, by its tolerance",
};

const SHARED: Record<BudgetRow["shared"], string> = {
  "each scan its own": "each scan its own",
  "common, cancels": "the same before and after: cancels",
  "common, kept": "the same before and after: kept",
  "not of a scan": "once",
};

/** Where the uncertainty of the stress comes from: what each input adds, what both scans share, and its part of the whole. */
export function BudgetTable({ budget, stress }: { budget: Budget; stress: Expanded }) {
  const { rows, coverageFactor, degreesOfFreedom, tools } = budget;
  const total = rows.reduce((sum, { contribution }) => sum + contribution ** 2, 0);
  const k = Math.round(coverageFactor * 100) / 100;
  return (
    <section aria-labelledby="budget">
      <h2 id="budget" className="font-semibold">
        Where the ± in {formatWithUncertainty(stress.value, stress.uncertainty, "stress", { unit: "MPa" })} comes from
      </h2>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Parts of the uncertainty">
        <table className="table">
          <thead>
            <tr>
              <th scope="col">Input</th>
              <th scope="col" className="num">
                Adds, k = {k}
                <span className="block">
                  <OwnHead unit="MPa" />
                </span>
              </th>
              <th scope="col" className="num">
                Part of the whole
                <span className="block">of the squares</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <Row key={row.input} row={row} k={coverageFactor} total={total} />
            ))}
          </tbody>
        </table>
      </div>
      <p className="mt-2 text-label text-quiet">
        {degreesOfFreedom === null ? "" : `k = ${k} for ${Math.round(degreesOfFreedom)} degrees of freedom. `}
        {tools.length > 0
          ? `The repeatability is that of ${tools.join(" and ")}.`
          : "No instrument with a repeatability study is known for these scans: the ± holds the scatter of the points alone. "}{" "}
        Not in it: a film that varies over the wafer.
      </p>
    </section>
  );
}

function Row({ row, k, total }: { row: BudgetRow; k: number; total: number }) {
  const { input, contribution, shared, note, given } = row;
  const share = total === 0 ? 0 : contribution ** 2 / total;
  return (
    <tr>
      <th scope="row" className="min-w-44 font-normal">
        {WORDS[input] ?? input}
        <span className="block text-label text-quiet">
          {SHARED[shared]}
          {shared !== "not of a scan" && `. ${note}`}
        </span>
      </th>
      {given ? (
        <>
          <td className="num">
            <OwnFigure unit="MPa">
              {withoutUnit(formatQuantity(k * contribution, "stress", { unit: "MPa", significant: 2 }))}
            </OwnFigure>
          </td>
          <td className="num">
            {share < 0.005 ? "under\u00A01\u00A0%" : formatQuantity(share, "fraction", { unit: "%", decimals: 0 })}
          </td>
        </>
      ) : (
        <td colSpan={2} className="num font-semibold text-caution">
          no tolerance given
        </td>
      )}
    </tr>
  );
}
