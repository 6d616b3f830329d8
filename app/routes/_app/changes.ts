import type { StandNow } from "#app/schemas/changes.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { changesStream } from "#app/services/changes/changes-stream.server.ts";
import { standOf, watchedRecords } from "#app/services/changes/stand-of.server.ts";
import type { Route } from "./+types/changes";

/** How things stand with the records named by `of`: as a stream of events, or (`once`) as they stand now, for who can't be told. */
export async function loader({ request, context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const of = url.searchParams.getAll("of");
  if (!url.searchParams.has("once")) return changesStream(scope, of, request.signal);
  return Response.json({ stand: await standOf(scope, watchedRecords(of)), own: false } satisfies StandNow);
}
