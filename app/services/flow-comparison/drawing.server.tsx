import { ComparisonFile } from "#app/components/comparison/ComparisonFile.tsx";
import { flowChartName } from "#app/components/flows/compare/chart-words.ts";
import { flowPlot } from "#app/components/flows/compare/flow-plot.ts";
import { FLOWS } from "#app/lib/comparison/kinds.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { fileNameOf, wrongNumber } from "../comparison.server.ts";
import { svgFile } from "../svg-file.server.ts";
import { flowComparison } from "./comparison.server.ts";

/** The chart of a comparison of flows as it prints, as a file of its own; refused unless there are two to six. */
export async function flowComparisonDrawing(
  scope: ActorScope,
  search: URLSearchParams,
): Promise<{ name: string; svg: string }> {
  const { members, compared } = await flowComparison(scope, search);
  if (!compared) throw wrongNumber(FLOWS);
  return {
    name: fileNameOf(members),
    svg: svgFile(
      <ComparisonFile name={flowChartName(compared.drawn)} plot={flowPlot(compared.drawn)} members={members} />,
    ),
  };
}
