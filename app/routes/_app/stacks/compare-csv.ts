import { comparisonCsv } from "#app/lib/stack-comparison/csv.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { comparedStacks } from "#app/services/stack-comparison/comparison.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/compare-csv";

/** Inputs, figures and curves of a comparison as a file. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { name, stacks } = await comparedStacks(scope, url.searchParams);
  const mark = await csvMarkOf(scope);
  return csvFile(name, comparisonCsv(stacks, mark));
}
