import { ComparisonPaper } from "#app/components/stacks/compare/ComparisonPaper.tsx";
import { paperAskedFor } from "#app/lib/paper-size.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { stackComparison, wrongNumber } from "#app/services/stack-comparison/comparison.server.ts";
import type { Route } from "./+types/comparison";

export const meta: Route.MetaFunction = () => [{ title: "Comparison of stacks · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { asked, stacks, compared } = await stackComparison(scope, url.searchParams);
  if (!compared) throw wrongNumber();
  return {
    asked,
    stacks,
    compared,
    paper: paperAskedFor(url.searchParams.get("paper")),
    preparedBy: scope.actor.name,
    printedAt: new Date().toISOString(),
  };
}

export default function ComparisonPrint({ loaderData }: Route.ComponentProps) {
  return <ComparisonPaper {...loaderData} />;
}
