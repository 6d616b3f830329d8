import { flowComparisonCsv } from "#app/lib/flow-comparison/csv.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { comparedFlows } from "#app/services/flow-comparison/comparison.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/compare-csv";

/** Figures, steps and curves of a comparison of flows as a file. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { name, flows } = await comparedFlows(scope, url.searchParams);
  return csvFile(name, flowComparisonCsv(flows, await csvMarkOf(scope)));
}
