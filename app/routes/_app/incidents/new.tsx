import { ReportPage } from "#app/components/incidents/ReportPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { reportForm } from "#app/services/incidents/report-form.server.ts";
import { reportPage } from "#app/services/incidents/report-page.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "Report an incident · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return reportPage(scopeOf(context), url.searchParams);
}

export async function action({ request, context }: Route.ActionArgs) {
  return reportForm(request, scopeOf(context));
}

export default function NewIncident({ loaderData, actionData }: Route.ComponentProps) {
  return <ReportPage {...loaderData} lastResult={actionData?.lastResult} />;
}
