import type { Paper } from "#app/lib/paper-size.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import type { SheetPagesAsked } from "./sheet-html.server.ts";

/** A sheet as PDF, drawn from the same document as its HTML. The renderer is large and loads when it is first asked for. */
export async function sheetPdf(
  document: SheetDocument,
  paper: Paper,
  { pages }: SheetPagesAsked = { pages: "all" },
): Promise<Uint8Array> {
  const { renderSheetPdf } = await import("./sheet-pdf-file.server.tsx");
  return renderSheetPdf(document, paper, pages);
}
