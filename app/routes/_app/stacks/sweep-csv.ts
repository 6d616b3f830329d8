import { attachment } from "#app/lib/content-disposition.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { sweepFile } from "#app/services/stack-sweep/files.server.tsx";
import type { Route } from "./+types/sweep-csv";

/** Every place of a sweep as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { name, csv } = await sweepFile(scopeOf(context), params.stackId, url.searchParams);
  return new Response(csv(), {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": attachment(`${name}.csv`),
      "Cache-Control": "no-store",
    },
  });
}
