import { ComparisonFile } from "#app/components/stacks/compare/ComparisonFile.tsx";
import type { ActorScope } from "#app/server/scope.server.ts";
import { svgFile } from "../svg-file.server.ts";
import { stackComparison, wrongNumber } from "./comparison.server.ts";

/** The chart of a comparison as it prints, as a file of its own; refused unless there are two to six stacks. */
export async function comparisonDrawing(
  scope: ActorScope,
  search: URLSearchParams,
): Promise<{ name: string; svg: string }> {
  const { stacks, compared } = await stackComparison(scope, search);
  if (!compared) throw wrongNumber();
  return {
    name: stacks
      .map(({ name }) => name)
      .join(", ")
      .slice(0, 120),
    svg: svgFile(<ComparisonFile stacks={stacks} compared={compared} />),
  };
}
