import { waferFiguresCsv } from "#app/lib/wafer-figures-csv.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { notFound } from "#app/server/problem.server.ts";
import { getWaferPage } from "#app/services/film-analysis/wafer-page.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/figures-csv";

/** What the scans of a film on a wafer say, as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { name, film } = await getWaferPage(scope, params.waferId, url.searchParams.get("film"));
  if (!film?.analysis) throw notFound("figure of this wafer");
  const mark = await csvMarkOf(scope);
  return csvFile(`${name}, figures`, waferFiguresCsv(name, film.name ?? "", film.analysis, mark));
}
