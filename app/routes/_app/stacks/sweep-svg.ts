import { scopeOf } from "#app/server/contexts.server.ts";
import { drawingFile } from "#app/server/drawing-file.server.ts";
import { sweepFile } from "#app/services/stack-sweep/files.server.tsx";
import type { Route } from "./+types/sweep-svg";

/** The drawing of a sweep as it prints, as a file. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { name, svg } = await sweepFile(scopeOf(context), params.stackId, url.searchParams);
  return drawingFile({ name, svg: svg() });
}
