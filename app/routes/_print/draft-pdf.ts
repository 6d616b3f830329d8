import { attachment } from "#app/lib/content-disposition.ts";
import { paperAskedFor } from "#app/lib/paper-size.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { draftSheet } from "#app/services/sheets/draft-sheet.server.ts";
import { sheetPdf } from "#app/services/sheets/sheet-pdf.server.ts";
import type { Route } from "./+types/draft-pdf";

/** The draft as PDF; `paper` and `leg` as on its page. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { document } = await draftSheet(scopeOf(context), params.assessmentId, url.searchParams.get("leg"));
  const bytes = await sheetPdf(document, paperAskedFor(url.searchParams.get("paper")));
  return new Response(new Uint8Array(bytes), {
    headers: {
      "Content-Type": "application/pdf",
      "Content-Disposition": attachment(`${document.name} draft.pdf`),
    },
  });
}
