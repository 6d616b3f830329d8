import { comparisonPlot } from "#app/components/comparison/comparison-plot.ts";
import { ComparisonPaper, type Printed } from "#app/components/comparison/ComparisonPaper.tsx";
import { STACKS } from "#app/lib/comparison/kinds.ts";
import type { ComparedStacks, StackComparisonView } from "#app/schemas/stack-comparison.ts";
import { chartName, TABLE_CAPTION } from "./chart-words.ts";

interface Props extends Printed, Pick<StackComparisonView, "asked" | "members"> {
  compared: ComparedStacks;
}

/** A comparison of stacks on one page. */
export function StackComparisonPaper(props: Props) {
  const { compared } = props;
  return (
    <ComparisonPaper
      kind={STACKS}
      plot={comparisonPlot(compared.chart)}
      chartName={chartName(compared.temperature)}
      head={`Comparison of stacks, ${compared.temperature}`}
      note="Bold: not as in A. Filled dot: own thickness. Bar: begins to curl. ± of a figure: k = 2."
      caption={TABLE_CAPTION}
      figureGroups={3}
      {...props}
    />
  );
}
