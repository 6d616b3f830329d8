import { scopeOf } from "#app/server/contexts.server.ts";
import { drawingFile } from "#app/server/drawing-file.server.ts";
import { flowComparisonDrawing } from "#app/services/flow-comparison/drawing.server.tsx";
import type { Route } from "./+types/compare-svg";

/** The chart of a comparison of flows as it prints, as a file. */
export async function loader({ context, url }: Route.LoaderArgs) {
  return drawingFile(await flowComparisonDrawing(scopeOf(context), url.searchParams));
}
