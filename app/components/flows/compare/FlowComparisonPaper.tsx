import { ComparisonPaper, type Printed } from "#app/components/comparison/ComparisonPaper.tsx";
import { FLOWS } from "#app/lib/comparison/kinds.ts";
import type { ComparedFlows, FlowComparisonView } from "#app/schemas/flow-comparison.ts";
import { flowChartName, TABLE_CAPTION } from "./chart-words.ts";
import { flowPlot } from "./flow-plot.ts";

interface Props extends Printed, Pick<FlowComparisonView, "asked" | "members"> {
  compared: ComparedFlows;
}

const NOTES = {
  thickness: "Filled dot: as thin as it gets. Bar: begins to curl. Ring: two warp alike.",
  steps: "Dash: what the tool of the step takes. Filled dot: tightest. Ring: two have changed places.",
};

/** A comparison of flows on one page. */
export function FlowComparisonPaper(props: Props) {
  const { compared, printedAt } = props;
  return (
    <ComparisonPaper
      kind={FLOWS}
      plot={flowPlot(compared.drawn)}
      chartName={flowChartName(compared.drawn)}
      head={`Comparison of flows as they stand ${printedAt.slice(0, 10)}. ${flowChartName(compared.drawn)}`}
      note={`Bold: not as in A. ${NOTES[compared.drawn.along]} ± of a warp: k = 2.`}
      caption={TABLE_CAPTION}
      figureGroups={2}
      {...props}
    />
  );
}
