import { attachment } from "#app/lib/content-disposition.ts";
import { filmsCsv } from "#app/lib/film-csv/write.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { allOfLibrary } from "#app/services/library/library.server.ts";
import type { Route } from "./+types/csv";

/** Every film of the library with all that is known of it, as a table that reads back unchanged. */
export async function loader({ context }: Route.LoaderArgs) {
  return new Response(filmsCsv(await allOfLibrary(scopeOf(context), "film")), {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment("Films.csv"),
      "Cache-Control": "no-store",
    },
  });
}
