import { attachment } from "#app/lib/content-disposition.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getScanFile } from "#app/services/scans.server.ts";
import type { Route } from "./+types/file";

/** A profilometer file exactly as it came, for saving; never shown in the browser. Every answer is marked as not to be sniffed. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const { name, bytes } = await getScanFile(scopeOf(context), params.fileId);
  return new Response(bytes, {
    headers: {
      "Content-Type": "application/octet-stream",
      "Content-Length": String(bytes.length),
      "Content-Disposition": attachment(name),
    },
  });
}
