import { filmsCsv } from "#app/lib/film-csv/write.ts";
import { tickedIds } from "#app/lib/ticked-ids.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import { allOfLibrary } from "#app/services/library/library.server.ts";
import { tickedFilms } from "#app/services/ticked/ticked-films.server.ts";
import type { Route } from "./+types/csv";

/** Every film of the library, or those that are ticked, with all that is known of each, as a table that reads back unchanged. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const mark = await csvMarkOf(scope);
  const films =
    url.searchParams.get("only") === "ticked"
      ? await tickedFilms(scope, tickedIds(url.searchParams))
      : await allOfLibrary(scope, "film");
  return csvFile("Films", filmsCsv(films, mark));
}
