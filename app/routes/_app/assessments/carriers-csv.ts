import { chosenRows, FINDER_SORTS, finderCsv } from "#app/lib/finder-rows.ts";
import { readListParams } from "#app/lib/list-params.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { finderOf } from "#app/services/assessments/finder.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/carriers-csv";

/** What the finder shows, all pages of it, as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const list = readListParams(url.searchParams, { sorts: FINDER_SORTS, filters: ["fits"] });
  const { rows, head } = await finderOf(scope, params.assessmentId, url.searchParams);
  const mark = await csvMarkOf(scope);
  return csvFile(`${head.flow.name}, carriers and bonds`, finderCsv(chosenRows(rows ?? [], list), mark));
}
