import { data } from "react-router";
import { SweepPage } from "#app/components/stacks/sweep/SweepPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { stackSweep } from "#app/services/stack-sweep/sweep.server.ts";
import type { Route } from "./+types/sweep";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Sweep${loaderData ? `, ${loaderData.stack.name}` : ""} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const view = await stackSweep(scopeOf(context), params.stackId, url.searchParams);
  return data(view, { status: view.swept ? 200 : 400 });
}

export default function SweepStack({ loaderData }: Route.ComponentProps) {
  return <SweepPage view={loaderData} />;
}
