import { redirect } from "react-router";
import { FloorFind } from "#app/components/floor/FloorFind.tsx";
import { statusPathIn } from "#app/lib/status-path.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { handOversToTake } from "#app/services/floor/hand-over.server.ts";
import { findLots } from "#app/services/floor/find-lot.server.ts";
import type { Route } from "./+types/find";

export const meta: Route.MetaFunction = () => [{ title: "Find a lot · Floor · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const typed = url.searchParams.get("lot") ?? "";
  // The code on a sheet leads to how that sheet stands.
  const sheet = statusPathIn(typed);
  if (sheet !== null) throw redirect(sheet);
  const found = await findLots(scope, typed);
  if (found.exact !== null) throw redirect(`/floor/lots/${found.exact}`);
  return {
    found,
    person: { id: scope.actor.id, name: scope.actor.name },
    waiting: await handOversToTake(scope),
    checkedAt: new Date().toISOString(),
  };
}

export default function Find({ loaderData }: Route.ComponentProps) {
  return <FloorFind {...loaderData} />;
}
