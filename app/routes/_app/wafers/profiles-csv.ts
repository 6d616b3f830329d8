import { profilesCsv } from "#app/lib/reading-csv.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { csvFile } from "#app/server/csv-file.server.ts";
import { getWaferProfiles } from "#app/services/film-analysis/wafer-page.server.ts";
import { csvMarkOf } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/profiles-csv";

/** The scans of a film on a wafer, matched, as a file that is read back without a change. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { name, profiles } = await getWaferProfiles(scope, params.waferId, url.searchParams.get("film"));
  const mark = await csvMarkOf(scope);
  return csvFile(`${name}, profiles`, profilesCsv(profiles, mark));
}
