import { useMemo } from "react";
import { ownPlot } from "../drawings/own-plot.ts";
import type { Plot } from "../drawings/plot.ts";
import { PlotLegend } from "../drawings/PlotLegend.tsx";
import { PrintPlot } from "../drawings/PrintPlot.tsx";
import { useOwnUnits } from "../units/own-units-context.ts";
import { PlotOnScreen } from "./PlotOnScreen.tsx";
import { PlotTable } from "./PlotTable.tsx";
import { useRested } from "./use-rested.ts";

export interface ChartFigureProps {
  plot: Plot;
  /** Accessible name of the chart. */
  label: string;
  /** What it shows, in one sentence, for all readers. */
  summary: string;
  /** Name of the x quantity, such as 'Silicon thickness'. */
  xName: string;
}

/** A chart in its reserved place, its drawing on paper and its figures as a table. */
export function ChartFigure({ plot: delivered, label, summary, xName }: ChartFigureProps) {
  const units = useOwnUnits();
  const plot = useMemo(() => ownPlot(delivered, units), [delivered, units]);
  const rested = useRested(plot);
  const unseen = useMemo(
    () => (
      <>
        <div className="print-only max-w-[118mm]">
          <PrintPlot plot={rested} label={label} />
        </div>
        <div className="mt-2 @min-[560px]:hidden print:hidden">
          <PlotLegend plot={rested} />
        </div>
      </>
    ),
    [rested, label],
  );
  const table = useMemo(() => <PlotTable plot={rested} label={label} xHead={xName} />, [rested, label, xName]);
  return (
    <figure className="@container">
      <div className="min-h-[376px] @min-[560px]:min-h-[484px] print:hidden">
        <PlotOnScreen plot={plot} label={label} xName={xName} />
      </div>
      {unseen}
      <figcaption className="mt-2 text-label text-quiet">{summary}</figcaption>
      {table}
    </figure>
  );
}
