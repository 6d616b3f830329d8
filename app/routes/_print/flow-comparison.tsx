import { FlowComparisonPaper } from "#app/components/flows/compare/FlowComparisonPaper.tsx";
import { FLOWS } from "#app/lib/comparison/kinds.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { wrongNumber } from "#app/services/comparison.server.ts";
import { flowComparison } from "#app/services/flow-comparison/comparison.server.ts";
import { paperFor } from "#app/services/site-settings.server.ts";
import type { Route } from "./+types/flow-comparison";

export const meta: Route.MetaFunction = () => [{ title: "Comparison of flows · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { asked, members, compared } = await flowComparison(scope, url.searchParams);
  if (!compared) throw wrongNumber(FLOWS);
  return {
    asked,
    members,
    compared,
    paper: await paperFor(scopeOf(context), url),
    preparedBy: scope.actor.name,
    printedAt: new Date().toISOString(),
  };
}

export default function FlowComparisonPrint({ loaderData }: Route.ComponentProps) {
  return <FlowComparisonPaper {...loaderData} />;
}
