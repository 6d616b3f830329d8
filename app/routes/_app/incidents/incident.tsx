import { IncidentPage } from "#app/components/incidents/IncidentPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { incidentForm } from "#app/services/incidents/incident-form.server.ts";
import { incidentPage } from "#app/services/incidents/incident-page.server.ts";
import type { Route } from "./+types/incident";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.incident.number ?? "Incident"} · Incidents · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  return { incident: await incidentPage(scopeOf(context), params.incidentId) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  return incidentForm(request, scopeOf(context), params.incidentId);
}

export default function Incident({ loaderData, actionData }: Route.ComponentProps) {
  return <IncidentPage incident={loaderData.incident} answer={actionData ?? null} />;
}
