import { renderToStaticMarkup } from "react-dom/server";
import { ComparisonFile } from "#app/components/stacks/compare/ComparisonFile.tsx";
import type { ActorScope } from "#app/server/scope.server.ts";
import { stackComparison, wrongNumber } from "./comparison.server.ts";

/** Colours of paper for the tokens of a drawing: a file has no style sheet to take them from. */
const PAPER: Record<string, string> = {
  raised: "#ffffff",
  surface: "#ffffff",
  quiet: "#3a3a3a",
  line: "#b5b5b5",
  edge: "#666666",
  wash: "#efefef",
  siwash: "#e4e4e4",
};
const INK = "#000000";

/** The chart of a comparison as it prints, as a file of its own; refused unless there are two to six stacks. */
export async function comparisonDrawing(
  scope: ActorScope,
  search: URLSearchParams,
): Promise<{ name: string; svg: string }> {
  const { stacks, compared } = await stackComparison(scope, search);
  if (!compared) throw wrongNumber();
  const markup = renderToStaticMarkup(<ComparisonFile stacks={stacks} compared={compared} />);
  return {
    name: stacks
      .map(({ name }) => name)
      .join(", ")
      .slice(0, 120),
    svg: `<?xml version="1.0" encoding="UTF-8"?>\n${markup.replace(/var\(--([a-z]+)\)/g, (_, token: string) => PAPER[token] ?? INK)}\n`,
  };
}
