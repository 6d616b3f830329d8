import { IncidentList } from "#app/components/incidents/IncidentList.tsx";
import { readListParams } from "#app/lib/list-params.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { INCIDENT_FILTERS, INCIDENT_SORTS, listIncidents } from "#app/services/incidents/incident-list.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Incidents · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, { sorts: INCIDENT_SORTS, filters: INCIDENT_FILTERS });
  return {
    page: withinPages(url, await listIncidents(scope, params)),
    programs: programsWhere(scope.actor, "see the work").map(({ programSlug, programName }) => ({
      value: programSlug,
      label: programName,
    })),
    mayReport: programsWhere(scope.actor, "report incidents").length > 0,
  };
}

export default function Incidents({ loaderData }: Route.ComponentProps) {
  return <IncidentList {...loaderData} />;
}
