import { handsOnly } from "#app/lib/sheet/sheet-document-of.ts";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { SHEET_FORMATS, SHEET_PAGES, type SheetFormat, type SheetPages } from "#app/schemas/sheet-revision.ts";
import { sheetHtml } from "./sheet-html.server.ts";
import { sheetPdf } from "./sheet-pdf.server.ts";

/** A sheet as bytes, and which of its forms it is. */
export interface SetFile {
  format: SheetFormat;
  paper: Paper;
  pages: SheetPages;
  bytes: Uint8Array;
}

/** Draws a sheet in every form in which it is handed out. */
export async function setSheet(document: SheetDocument): Promise<SetFile[]> {
  const files: SetFile[] = [];
  for (const paper of Object.keys(PAPERS) as Paper[])
    for (const pages of SHEET_PAGES)
      for (const format of SHEET_FORMATS)
        files.push({ format, paper, pages, bytes: await setFile(document, format, paper, pages) });
  return files;
}

/** Draws one of them. */
export async function setFile(
  whole: SheetDocument,
  format: SheetFormat,
  paper: Paper,
  pages: SheetPages,
): Promise<Uint8Array> {
  const document = pages === "hands" ? handsOnly(whole) : whole;
  if (format === "pdf") return sheetPdf(document, paper, { pages });
  return new TextEncoder().encode(await sheetHtml(document, paper, { pages }));
}
