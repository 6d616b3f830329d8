import { attachment } from "#app/lib/content-disposition.ts";
import { predictionsCsv } from "#app/lib/predictions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { predictionPoints } from "#app/services/predictions/predictions.server.ts";
import type { Route } from "./+types/points-csv";

/** The points that the page shows, all pages of them, as a file. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const { of, points } = await predictionPoints(scopeOf(context), url.searchParams);
  return new Response(predictionsCsv(of, points), {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`predicted and measured ${of}.csv`),
      "Cache-Control": "no-store",
    },
  });
}
