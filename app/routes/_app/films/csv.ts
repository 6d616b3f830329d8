import { filmsCsv } from "#app/lib/film-csv/write.ts";
import { tickedIds } from "#app/lib/ticked-ids.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { allOfLibrary } from "#app/services/library/library.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/csv";

/** Every film of the library, or those that are ticked, with all that is known of each, as a table that reads back unchanged. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const mark = await csvMarkOf(scope);
  const films = await allOfLibrary(scope, "film");
  if (url.searchParams.get("only") !== "ticked") return csvFile("Films", filmsCsv(films, mark));
  const ids = new Set(tickedIds(url.searchParams));
  const ticked = films.filter(({ id }) => ids.has(id));
  if (ticked.length === 0)
    throw problem(400, "No film of the library is ticked. Go back to the list, tick films and download them again.");
  return csvFile("Films", filmsCsv(ticked, mark));
}
