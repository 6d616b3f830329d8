import { data } from "react-router";
import { WindowPage } from "#app/components/assessments/WindowPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { windowOf } from "#app/services/assessments/window.server.ts";
import type { Route } from "./+types/window";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Process window${loaderData ? `, ${loaderData.head.flow.name}` : ""} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const page = await windowOf(scopeOf(context), params.assessmentId, url.searchParams);
  const faults = [page.x, page.y].some(({ faults: { from, to } }) => from ?? to);
  return data(page, { status: faults || page.fault ? 400 : 200 });
}

export default function ProcessWindow({ loaderData }: Route.ComponentProps) {
  return <WindowPage page={loaderData} />;
}
