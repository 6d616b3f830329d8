import { StackComparisonPaper } from "#app/components/stacks/compare/StackComparisonPaper.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { STACKS } from "#app/lib/comparison/kinds.ts";
import { wrongNumber } from "#app/services/comparison.server.ts";
import { stackComparison } from "#app/services/stack-comparison/comparison.server.ts";
import { paperFor } from "#app/services/site-settings.server.ts";
import type { Route } from "./+types/comparison";

export const meta: Route.MetaFunction = () => [{ title: "Comparison of stacks · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { asked, members, compared } = await stackComparison(scope, url.searchParams);
  if (!compared) throw wrongNumber(STACKS);
  return {
    asked,
    members,
    compared,
    paper: await paperFor(scopeOf(context), url),
    preparedBy: scope.actor.name,
    printedAt: new Date().toISOString(),
  };
}

export default function ComparisonPrint({ loaderData }: Route.ComponentProps) {
  return <StackComparisonPaper {...loaderData} />;
}
