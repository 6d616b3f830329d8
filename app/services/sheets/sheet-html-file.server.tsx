import { renderToStaticMarkup } from "react-dom/server";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { handsOnly } from "#app/lib/sheet/sheet-document-of.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";

/** The file's text: one document, its styles and fonts inside. */
export async function renderSheetHtml(whole: SheetDocument, paper: Paper, pages: "hands" | "all"): Promise<string> {
  const document = pages === "hands" ? handsOnly(whole) : whole;
  return `<!doctype html>${renderToStaticMarkup(
    <html lang={document.language}>
      <head>
        <meta charSet="utf-8" />
        <title>{document.name}</title>
      </head>
      <body className={PAPERS[paper].page}>
        <h1>{document.hands.answer}</h1>
      </body>
    </html>,
  )}`;
}
