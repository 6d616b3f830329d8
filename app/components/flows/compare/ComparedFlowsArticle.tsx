import { ChartFigure } from "#app/components/charts/ChartFigure.tsx";
import { ComparedArticle } from "#app/components/comparison/ComparedArticle.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { ComparedFlows, FlowComparisonView } from "#app/schemas/flow-comparison.ts";
import { flowChartName, TABLE_CAPTION } from "./chart-words.ts";
import { FlowCompareOptions } from "./FlowCompareOptions.tsx";
import { flowPlot } from "./flow-plot.ts";

const SUMMARIES = {
  thickness:
    "Each step that thins is stopped on its way and the wafer let go. Upright stretch of a line: what is done between two thinnings. Filled dot: as thin as it gets. Upright bar: where it begins to curl; the shaded stretch is curled about one axis. Numbered ring: two warp alike. A line has a gap where the roll is past half a turn. Gravity is left out.",
  steps:
    "Steps of all flows, paired by kind and name; a flow has no point where it has no such step or where tape or frame holds it flat. Red dash: what the tool of the step takes, the strictest where flows use several. Filled dot: the warp that uses most of its tool’s limit. Numbered ring: two flows have changed places since the step before, by more than their uncertainties. Shaded: rolled up, without a warp.",
};

/** The answer, the lines and where they cross, what differs, and what moves each deciding warp. */
export function ComparedFlowsArticle({ view, compared }: { view: FlowComparisonView; compared: ComparedFlows }) {
  const { drawn, basis } = compared;
  const plot = flowPlot(drawn);
  const name = flowChartName(drawn);
  const lines = plot.series.filter(({ dash }) => dash !== "none");
  return (
    <ComparedArticle
      asked={view.asked}
      members={view.members}
      compared={compared}
      chartName={name}
      chart={
        <>
          <p className="mb-2 text-quiet">{noBreak(basis)}</p>
          <FlowCompareOptions view={view} compared={compared} />
          {lines.length === 0 ? (
            <p className="text-quiet">None of them lies with a warp that could be drawn here.</p>
          ) : (
            <ChartFigure
              plot={plot}
              label={name}
              summary={SUMMARIES[drawn.along]}
              xName={drawn.along === "thickness" ? "Silicon thickness" : "Step"}
            />
          )}
        </>
      }
      table={{
        caption: TABLE_CAPTION,
        note: "A step is as it leaves its tool; ± of a warp is its expanded uncertainty, k\u00A0=\u00A02, ± of a thickness its tolerance.",
      }}
      movers={{
        title: "What moves the tightest warp most",
        note: "How far each input’s tolerance moves it to either side, by walks of the flow with the input at both ends, the five largest. Bars of all flows have one scale.",
      }}
    />
  );
}
