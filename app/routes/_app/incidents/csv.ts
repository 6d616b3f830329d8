import { incidentsCsv } from "#app/lib/incidents-csv.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { allIncidents, INCIDENT_FILTERS, INCIDENT_SORTS } from "#app/services/incidents/incident-list.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/csv";

/** The incidents of the list as it is searched and sorted, every page of it. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const params = readListParams(url.searchParams, { sorts: INCIDENT_SORTS, filters: INCIDENT_FILTERS });
  return csvFile("Incidents", incidentsCsv(await allIncidents(scope, params), await csvMarkOf(scope)));
}
