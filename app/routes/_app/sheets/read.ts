import { scopeOf } from "#app/server/contexts.server.ts";
import { paperFor } from "#app/services/site-settings.server.ts";
import { storedSheet } from "#app/services/sheets/sheet-file.server.ts";
import type { Route } from "./+types/read";

/** A paper shows itself with the typeface that it brings: no script, no form, nothing from anywhere. */
const POLICY = [
  "default-src 'none'",
  "style-src 'unsafe-inline'",
  "font-src data:",
  "img-src data:",
  "base-uri 'none'",
  "form-action 'none'",
  "frame-ancestors 'none'",
].join("; ");

/** The stored HTML of a sheet, as it was released. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { bytes } = await storedSheet(scope, params.revisionId, {
    format: "html",
    paper: await paperFor(scope, url),
    pages: url.searchParams.get("pages") === "hands" ? "hands" : "all",
    leg: legAsked(url.searchParams.get("leg")),
  });
  return new Response(new Uint8Array(bytes), {
    headers: { "Content-Type": "text/html; charset=utf-8", "Content-Security-Policy": POLICY },
  });
}

const legAsked = (text: string | null) => (text !== null && /^\d{1,3}$/.test(text) ? Number(text) : 0);
