import { scopeOf } from "#app/server/contexts.server.ts";
import { searchEverything } from "#app/services/search.server.ts";
import type { Route } from "./+types/search-found";

/** What the palette shows of a search. */
export async function loader({ context, url }: Route.LoaderArgs) {
  return Response.json(await searchEverything(scopeOf(context), url.searchParams.get("q")));
}
