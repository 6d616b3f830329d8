import { ComparePage } from "#app/components/stacks/compare/ComparePage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { stackComparison } from "#app/services/stack-comparison/comparison.server.ts";
import type { Route } from "./+types/compare";

export const meta: Route.MetaFunction = () => [{ title: "Compare stacks · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return stackComparison(scopeOf(context), url.searchParams);
}

export default function CompareStacks({ loaderData }: Route.ComponentProps) {
  return <ComparePage view={loaderData} />;
}
