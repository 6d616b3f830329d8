import { redirect } from "react-router";
import { FloorFind } from "#app/components/floor/FloorFind.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { findLots } from "#app/services/floor/find-lot.server.ts";
import type { Route } from "./+types/find";

export const meta: Route.MetaFunction = () => [{ title: "Find a lot · Floor · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const found = await findLots(scope, url.searchParams.get("lot") ?? "");
  if (found.exact !== null) throw redirect(`/floor/lots/${found.exact}`);
  return { found, person: scope.actor.name };
}

export default function Find({ loaderData }: Route.ComponentProps) {
  return <FloorFind {...loaderData} />;
}
