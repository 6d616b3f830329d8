import { scopeOf } from "#app/server/contexts.server.ts";
import { photoFile } from "#app/services/incidents/keep-photos.server.ts";
import type { Route } from "./+types/photo";

/** A photo of an incident, for nothing but being looked at: no browser may take it for anything else, and no cache shares it. Every answer is marked as not to be sniffed. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const { type, bytes } = await photoFile(scopeOf(context), params.incidentId, params.photoId);
  return new Response(bytes, {
    headers: {
      "Content-Type": type,
      "Content-Length": String(bytes.length),
      "Content-Disposition": "inline",
      "Content-Security-Policy": "default-src 'none'; sandbox",
      "Cross-Origin-Resource-Policy": "same-origin",
      "Cache-Control": "private, no-store",
    },
  });
}
