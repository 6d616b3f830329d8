import { attachment } from "#app/lib/content-disposition.ts";
import { chosenRows, FINDER_SORTS, finderCsv } from "#app/lib/finder-rows.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { finderOf } from "#app/services/assessments/finder.server.ts";
import type { Route } from "./+types/carriers-csv";

/** What the finder shows, all pages of it, as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const list = readListParams(url.searchParams, { sorts: FINDER_SORTS, filters: ["fits"] });
  const { rows, head } = await finderOf(scopeOf(context), params.assessmentId, url.searchParams);
  return new Response(finderCsv(chosenRows(rows ?? [], list)), {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`${head.flow.name}, carriers and bonds.csv`),
      "Cache-Control": "no-store",
    },
  });
}
