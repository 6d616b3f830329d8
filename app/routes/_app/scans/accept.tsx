import type { ShouldRevalidateFunctionArgs } from "react-router";
import { AcceptPage } from "#app/components/films/AcceptPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { acceptForm } from "#app/services/films/accept-form.server.ts";
import { acceptance } from "#app/services/films/accept-scan.server.ts";
import type { Route } from "./+types/accept";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Accept ${loaderData?.acceptance.scan.label ?? "a scan"} · Scans · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return { acceptance: await acceptance(scopeOf(context), params.scanId) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  return acceptForm(request, scopeOf(context), params.scanId);
}

/** After a conflict it is to be seen what accepting does now. */
export function shouldRevalidate({ actionStatus, defaultShouldRevalidate }: ShouldRevalidateFunctionArgs): boolean {
  return actionStatus === 409 || defaultShouldRevalidate;
}

export default function Accept({ loaderData, actionData }: Route.ComponentProps) {
  return <AcceptPage acceptance={loaderData.acceptance} lastResult={actionData?.lastResult} />;
}
