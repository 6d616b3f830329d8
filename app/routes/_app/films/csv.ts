import { filmsCsv } from "#app/lib/film-csv/write.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { allOfLibrary } from "#app/services/library/library.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/csv";

/** Every film of the library with all that is known of it, as a table that reads back unchanged. */
export async function loader({ context }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const mark = await csvMarkOf(scope);
  return csvFile("Films", filmsCsv(await allOfLibrary(scope, "film"), mark));
}
