import { lazy, Suspense } from "react";
import { ownPlot } from "../drawings/own-plot.ts";
import type { Plot } from "../drawings/plot.ts";
import { PlotLegend } from "../drawings/PlotLegend.tsx";
import { PrintPlot } from "../drawings/PrintPlot.tsx";
import type { InteractivePlotProps } from "./InteractivePlot.tsx";
import { useOwnUnits } from "../units/own-units-context.ts";
import { useInBrowser } from "../ui/use-in-browser.ts";
import { PlotTable } from "./PlotTable.tsx";

export interface ChartFigureProps {
  plot: Plot;
  /** Accessible name of the chart. */
  label: string;
  /** What it shows, in one sentence, for all readers. */
  summary: string;
  /** Name of the x quantity, such as 'Silicon thickness'. */
  xName: string;
}

/** The charting library comes only where a chart is on the page; should it not come at all, the drawing stays. */
const InteractivePlot = lazy(() =>
  import("./InteractivePlot.tsx").catch(() => ({
    default: ({ plot, label }: InteractivePlotProps) => <StaticPlot plot={plot} label={label} />,
  })),
);

/**
 * A chart in its reserved place. The server sends the plain drawing; in the browser the interactive chart takes its
 * place in the same frame, so nothing moves. Paper always gets the drawing.
 */
export function ChartFigure({ plot: delivered, label, summary, xName }: ChartFigureProps) {
  const plot = ownPlot(delivered, useOwnUnits());
  const inBrowser = useInBrowser();
  const drawing = <StaticPlot plot={plot} label={label} />;
  return (
    <figure className="@container">
      <div className="min-h-[376px] @min-[560px]:min-h-[484px] print:hidden">
        {inBrowser ? (
          <Suspense fallback={drawing}>
            <InteractivePlot plot={plot} label={label} xName={xName} />
          </Suspense>
        ) : (
          drawing
        )}
      </div>
      <div className="print-only max-w-[118mm]">
        <PrintPlot plot={plot} label={label} />
      </div>
      <div className="mt-2 @min-[560px]:hidden print:hidden">
        <PlotLegend plot={plot} />
      </div>
      <figcaption className="mt-2 text-label text-quiet">{summary}</figcaption>
      <PlotTable plot={plot} label={label} xHead={xName} />
    </figure>
  );
}

/** Both widths of the drawing; the stylesheet shows the one that fits, since the server does not know the window. */
function StaticPlot({ plot, label }: { plot: Plot; label: string }) {
  return (
    <>
      <PrintPlot plot={plot} label={label} className="hidden h-[428px] w-full @min-[560px]:block" />
      <PrintPlot
        plot={plot}
        label={label}
        width={340}
        height={320}
        withoutEndLabels
        className="block h-80 w-full @min-[560px]:hidden"
      />
    </>
  );
}
