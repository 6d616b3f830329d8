import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import { sweepFile } from "#app/services/stack-sweep/files.server.tsx";
import type { Route } from "./+types/sweep-csv";

/** Every place of a sweep as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { name, csv } = await sweepFile(scope, params.stackId, url.searchParams);
  return csvFile(name, csv(await csvMarkOf(scope)));
}
