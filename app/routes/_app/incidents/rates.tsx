import { IncidentRates } from "#app/components/incidents/IncidentRates.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { incidentRatesView } from "#app/services/incidents/incident-rates.server.ts";
import type { Route } from "./+types/rates";

export const meta: Route.MetaFunction = () => [{ title: "Rates of breakage · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return incidentRatesView(scopeOf(context), url.searchParams.get("program") ?? "");
}

export default function Rates({ loaderData }: Route.ComponentProps) {
  return <IncidentRates {...loaderData} />;
}
