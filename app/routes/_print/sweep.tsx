import { SweepPaper } from "#app/components/stacks/sweep/SweepPaper.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { sweptStack } from "#app/services/stack-sweep/sweep.server.ts";
import { paperFor } from "#app/services/site-settings.server.ts";
import type { Route } from "./+types/sweep";

export const meta: Route.MetaFunction = () => [{ title: "Sweep of a stack · Planeward" }];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { stack, asked, swept } = await sweptStack(scope, params.stackId, url.searchParams);
  return {
    view: { stack, asked, swept },
    paper: await paperFor(scopeOf(context), url),
    preparedBy: scope.actor.name,
    printedAt: new Date().toISOString(),
  };
}

export default function SweepPrint({ loaderData }: Route.ComponentProps) {
  return <SweepPaper {...loaderData} />;
}
