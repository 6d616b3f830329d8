import { attachment } from "#app/lib/content-disposition.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { draftSheet } from "#app/services/sheets/draft-sheet.server.ts";
import { sheetPdf } from "#app/services/sheets/sheet-pdf.server.ts";
import { paperFor } from "#app/services/site-settings.server.ts";
import type { Route } from "./+types/draft-pdf";

/** The draft as PDF; `paper` and `leg` as on its page, the site's paper where none is asked for. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const { document } = await draftSheet(scope, params.assessmentId, url.searchParams.get("leg"));
  const bytes = await sheetPdf(document, await paperFor(scope, url));
  return new Response(new Uint8Array(bytes), {
    headers: {
      "Content-Type": "application/pdf",
      "Content-Disposition": attachment(`${document.name} draft.pdf`),
    },
  });
}
