import type { Plot } from "../drawings/plot.ts";
import { seriesValue } from "../drawings/series-value.ts";

export interface PlotTableProps {
  plot: Plot;
  /** Name of the chart that the figures belong to. */
  label: string;
  /** Head of the first column. */
  xHead: string;
}

/** The figures of a plot as a table, at its ticks, limits, markers and the chosen value; folded away until asked for. */
export function PlotTable({ plot, label, xHead }: PlotTableProps) {
  const places = [
    ...plot.x.ticks.map((tick) => tick.value),
    ...(plot.xLimits ?? []).map((limit) => limit.value),
    ...plot.series.flatMap((series) => series.markersAt ?? []),
    ...(plot.chosen ? [plot.chosen.x] : []),
  ];
  const rows = [...new Map(places.map((value) => [plot.x.format(value), value]))]
    .filter(([, value]) => value >= plot.x.from && value <= plot.x.to)
    .sort(([, a], [, b]) => a - b);
  return (
    <details className="screen-only mt-2">
      <summary className="link w-fit cursor-pointer text-label">Figures as a table</summary>
      <div className="overflow-x-auto" role="region" aria-label={`Figures: ${label}`} tabIndex={0}>
        <table className="table">
          <thead>
            <tr>
              <th scope="col" className="num">
                {xHead}
              </th>
              {plot.series.map((series) => (
                <th key={series.id} scope="col" className="num">
                  {series.label}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(([text, x]) => (
              <tr key={text}>
                <th scope="row" className="num">
                  {text}
                </th>
                {plot.series.map((series) => {
                  const value = seriesValue(plot, series, x);
                  return (
                    <td key={series.id} className="num">
                      {value === null ? "–" : plot.y.format(value)}
                    </td>
                  );
                })}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
