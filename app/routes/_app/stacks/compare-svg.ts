import { attachment } from "#app/lib/content-disposition.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { comparisonDrawing } from "#app/services/stack-comparison/drawing.server.tsx";
import type { Route } from "./+types/compare-svg";

/** The chart of a comparison as it prints, as a file. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const { name, svg } = await comparisonDrawing(scopeOf(context), url.searchParams);
  return new Response(svg, {
    headers: {
      "Content-Type": "image/svg+xml; charset=utf-8",
      "Content-Disposition": attachment(`${name}.svg`),
      "Cache-Control": "no-store",
    },
  });
}
