import { ChartFigure } from "#app/components/charts/ChartFigure.tsx";
import { ComparedArticle } from "#app/components/comparison/ComparedArticle.tsx";
import { comparisonPlot } from "#app/components/comparison/comparison-plot.ts";
import type { ComparedStacks, StackComparisonView } from "#app/schemas/stack-comparison.ts";
import { chartName, TABLE_CAPTION } from "./chart-words.ts";
import { CompareOptions } from "./CompareOptions.tsx";

/** The answer, the curves and where they cross, what differs, and what moves each warp. */
export function Compared({ view, compared }: { view: StackComparisonView; compared: ComparedStacks }) {
  const { temperature, chart } = compared;
  const plot = comparisonPlot(chart);
  return (
    <ComparedArticle
      asked={view.asked}
      members={view.members}
      compared={compared}
      chartName={chartName(temperature)}
      chart={
        <>
          <CompareOptions view={view} faults={compared.faults} />
          {plot.series.length === 0 ? (
            <p className="text-quiet">None of them warps enough in this range for a curve to be drawn.</p>
          ) : (
            <ChartFigure
              plot={plot}
              label={chartName(temperature)}
              summary="Filled dot: its own thickness. Upright bar: where it begins to curl; the shaded stretch left of it is curled about one axis. Numbered ring: two warp alike. A curve ends where the roll passes half a turn. Gravity is left out."
              xName="Silicon thickness"
            />
          )}
        </>
      }
      table={{
        caption: TABLE_CAPTION,
        note: "± of a bow or warp is its expanded uncertainty, k\u00A0=\u00A02; ± of an input is its tolerance.",
      }}
      movers={{
        title: "What moves the warp most",
        note: `At its own thickness, ${temperature}: how far each input’s tolerance moves the warp to either side, to first order, the five largest. Bars of all stacks have one scale.`,
      }}
    />
  );
}
