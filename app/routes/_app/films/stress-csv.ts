import { attachment } from "#app/lib/content-disposition.ts";
import { stressCsv } from "#app/lib/stress-csv.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { stressValues } from "#app/services/films/stress-history.server.ts";
import type { Route } from "./+types/stress-csv";

/** Every value of a film's history that the list shows, as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { film, rows } = await stressValues(scopeOf(context), params.filmId, url.searchParams);
  return new Response(stressCsv(rows), {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`${film}, stress history.csv`),
      "Cache-Control": "no-store",
    },
  });
}
