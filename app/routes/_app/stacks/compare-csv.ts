import { attachment } from "#app/lib/content-disposition.ts";
import { comparisonCsv } from "#app/lib/stack-comparison/csv.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { comparedStacks } from "#app/services/stack-comparison/comparison.server.ts";
import type { Route } from "./+types/compare-csv";

/** Inputs, figures and curves of a comparison as a file. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const { name, stacks } = await comparedStacks(scopeOf(context), url.searchParams);
  return new Response(comparisonCsv(stacks), {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`${name}.csv`),
      "Cache-Control": "no-store",
    },
  });
}
