import { HandOverList } from "#app/components/floor/HandOverList.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { handOvers } from "#app/services/floor/hand-over.server.ts";
import type { Route } from "./+types/hand-overs";

export const meta: Route.MetaFunction = () => [{ title: "Hand-overs · Floor · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const query = (url.searchParams.get("place") ?? "").replaceAll("\0", "").trim().slice(0, 80);
  return {
    query,
    rows: await handOvers(scope, query),
    given: url.searchParams.get("done") === "given",
    person: { id: scope.actor.id, name: scope.actor.name },
    checkedAt: new Date().toISOString(),
  };
}

export default function HandOvers({ loaderData }: Route.ComponentProps) {
  return <HandOverList {...loaderData} />;
}
