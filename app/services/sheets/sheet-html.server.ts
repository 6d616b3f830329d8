import type { Paper } from "#app/lib/paper-size.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";

/** Which pages of a sheet: those for hands alone, as a guest gets them, or all. */
export interface SheetPagesAsked {
  pages: "hands" | "all";
}

/** A sheet as one HTML file that stands by itself. */
export async function sheetHtml(
  document: SheetDocument,
  paper: Paper,
  { pages }: SheetPagesAsked = { pages: "all" },
): Promise<string> {
  const { renderSheetHtml } = await import("./sheet-html-file.server.tsx");
  return renderSheetHtml(document, paper, pages);
}
