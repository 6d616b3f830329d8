import { TriedPage } from "#app/components/assessments/TriedPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { triedOf } from "#app/services/assessments/tried.server.ts";
import type { Route } from "./+types/tried";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Working of a change${loaderData ? `, ${loaderData.head.flow.name}` : ""} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  return triedOf(scopeOf(context), params.assessmentId, url.searchParams);
}

export default function Tried({ loaderData }: Route.ComponentProps) {
  return <TriedPage page={loaderData} />;
}
