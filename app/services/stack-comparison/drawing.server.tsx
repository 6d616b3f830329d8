import { comparisonPlot } from "#app/components/comparison/comparison-plot.ts";
import { ComparisonFile } from "#app/components/comparison/ComparisonFile.tsx";
import { chartName } from "#app/components/stacks/compare/chart-words.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { svgFile } from "../svg-file.server.ts";
import { STACKS } from "#app/lib/comparison/kinds.ts";
import { fileNameOf, wrongNumber } from "../comparison.server.ts";
import { stackComparison } from "./comparison.server.ts";

/** The chart of a comparison as it prints, as a file of its own; refused unless there are two to six stacks. */
export async function comparisonDrawing(
  scope: ActorScope,
  search: URLSearchParams,
): Promise<{ name: string; svg: string }> {
  const { members, compared } = await stackComparison(scope, search);
  if (!compared) throw wrongNumber(STACKS);
  return {
    name: fileNameOf(members),
    svg: svgFile(
      <ComparisonFile name={chartName(compared.temperature)} plot={comparisonPlot(compared.chart)} members={members} />,
    ),
  };
}
