import { attachment } from "#app/lib/content-disposition.ts";
import { waferFiguresCsv } from "#app/lib/wafer-figures-csv.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { notFound } from "#app/server/problem.server.ts";
import { getWaferPage } from "#app/services/film-analysis/wafer-page.server.ts";
import type { Route } from "./+types/figures-csv";

/** What the scans of a film on a wafer say, as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { name, film } = await getWaferPage(scopeOf(context), params.waferId, url.searchParams.get("film"));
  if (!film?.analysis) throw notFound("figure of this wafer");
  return new Response(waferFiguresCsv(name, film.name ?? "", film.analysis), {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`${name}, figures.csv`),
      "Cache-Control": "no-store",
    },
  });
}
