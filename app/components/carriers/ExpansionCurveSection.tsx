import { expansionPlot } from "#app/components/drawings/expansion-plot.ts";
import { PrintPlot } from "#app/components/drawings/PrintPlot.tsx";
import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { formatQuantity } from "#app/engine/units/format.ts";
import { curveRangeWords, type ExpansionRecord } from "#app/lib/expansion-rows.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";
import { ownPlot } from "#app/components/drawings/own-plot.ts";
import { useOwnUnits } from "#app/components/units/own-units-context.ts";

interface Props {
  curve: ExpansionRecord;
  /** the stated mean, onto which the curve is moved */
  expansion: LibraryRecords["carrier"]["expansion"];
}

/** How a carrier expands over temperature: its curve, where that comes from, and its points as a table. */
export function ExpansionCurveSection({ curve, expansion }: Props) {
  const units = useOwnUnits();
  const { temperatures, coefficients, tolerance, source, note, on } = curve;
  const points = temperatures.map((x, at) => ({ x, y: coefficients[at] ?? 0 }));
  return (
    <section aria-labelledby="expansion-curve" className="border-t border-line p-4 tablet:p-6">
      <h2 id="expansion-curve" className="font-semibold">
        Expansion over temperature
      </h2>
      <p className="mt-1 text-quiet">
        {points.length} points, {curveRangeWords(curve)}
        {tolerance !== null && `, ± ${formatQuantity(tolerance, "expansion", { unit: "ppm/K" })} all along`}.{" "}
        <SourceMark kind={source} />
        {[note, on].filter(Boolean).map((words) => `, ${words}`)}
      </p>
      {expansion && (
        <p className="mt-1 text-quiet">
          Its mean is stated as {formatMeasured(expansion, "expansion", { unit: "ppm/K" })}: the whole curve is moved
          onto it.
        </p>
      )}
      <div className="mt-3 grid gap-4 tablet:grid-cols-[minmax(0,1fr)_auto]">
        <PrintPlot
          plot={ownPlot(expansionPlot(points), units)}
          label="Expansion over temperature"
          width={420}
          height={260}
          withoutEndLabels
          className="h-[260px] w-full max-w-[420px]"
        />
        <div className="max-h-[260px] overflow-y-auto" tabIndex={0} role="region" aria-label="Points of the curve">
          <table className="table">
            <caption className="sr-only">Expansion over temperature</caption>
            <thead>
              <tr>
                <th scope="col" className="num">
                  <OwnHead unit="°C" />
                </th>
                <th scope="col" className="num">
                  ppm/K
                </th>
              </tr>
            </thead>
            <tbody>
              {points.map(({ x, y }) => (
                <tr key={x}>
                  <th scope="row" className="num font-normal">
                    <OwnFigure unit="°C">{figure(x, "temperature", "°C")}</OwnFigure>
                  </th>
                  <td className="num">{figure(y, "expansion", "ppm/K")}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      </div>
    </section>
  );
}

/** A figure under a head that has its unit. */
const figure = (value: number, dimension: "temperature" | "expansion", unit: string) =>
  formatQuantity(value, dimension, { unit, significant: 6, trim: true }).split("\u00A0")[0];
