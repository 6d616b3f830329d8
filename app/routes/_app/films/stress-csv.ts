import { stressCsv } from "#app/lib/stress-csv.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { stressValues } from "#app/services/films/stress-history.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/stress-csv";

/** Every value of a film's history that the list shows, as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { film, rows } = await stressValues(scope, params.filmId, url.searchParams);
  const mark = await csvMarkOf(scope);
  return csvFile(`${film}, stress history`, stressCsv(rows, mark));
}
