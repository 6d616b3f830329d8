import { redirect } from "react-router";
import { FloorFind } from "#app/components/floor/FloorFind.tsx";
import { statusPath } from "#app/lib/status-path.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { findLots } from "#app/services/floor/find-lot.server.ts";
import type { Route } from "./+types/find";

/** The address of a paper's status, as the code on it holds it. */
const SHEET = /^https?:\/\/[^/\s]+\/s\/([\w-]{22})$/;

export const meta: Route.MetaFunction = () => [{ title: "Find a lot · Floor · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  // The code on a sheet leads to how that sheet stands.
  const sheet = SHEET.exec(url.searchParams.get("lot") ?? "")?.[1];
  if (sheet !== undefined) throw redirect(statusPath(sheet));
  const found = await findLots(scope, url.searchParams.get("lot") ?? "");
  if (found.exact !== null) throw redirect(`/floor/lots/${found.exact}`);
  return { found, person: scope.actor.name };
}

export default function Find({ loaderData }: Route.ComponentProps) {
  return <FloorFind {...loaderData} />;
}
