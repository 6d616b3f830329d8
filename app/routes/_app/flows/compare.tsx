import { FlowComparePage } from "#app/components/flows/compare/FlowComparePage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { flowComparison } from "#app/services/flow-comparison/comparison.server.ts";
import type { Route } from "./+types/compare";

export const meta: Route.MetaFunction = () => [{ title: "Compare flows · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return flowComparison(scopeOf(context), url.searchParams);
}

export default function CompareFlows({ loaderData }: Route.ComponentProps) {
  return <FlowComparePage view={loaderData} />;
}
