import { predictionsCsv } from "#app/lib/predictions.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { predictionPoints } from "#app/services/predictions/predictions.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/points-csv";

/** The points that the page shows, all pages of them, as a file. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { of, points } = await predictionPoints(scope, url.searchParams);
  const mark = await csvMarkOf(scope);
  return csvFile(`predicted and measured ${of}`, predictionsCsv(of, points, mark));
}
