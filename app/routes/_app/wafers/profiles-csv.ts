import { attachment } from "#app/lib/content-disposition.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getWaferProfiles } from "#app/services/film-analysis/wafer-page.server.ts";
import type { Route } from "./+types/profiles-csv";

/** The scans of a film on a wafer, matched, as a file that is read back without a change. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { name, csv } = await getWaferProfiles(scopeOf(context), params.waferId, url.searchParams.get("film"));
  return new Response(csv, {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`${name}, profiles.csv`),
      "Cache-Control": "no-store",
    },
  });
}
