import { apiDocument } from "#app/services/api/document.server.ts";

/** The document of the API, for whoever writes a program against it. It says nothing of anybody's work. */
export function loader() {
  return Response.json(apiDocument(), { headers: { "Cache-Control": "no-cache" } });
}
