import { renderToStaticMarkup } from "react-dom/server";
import { DOM_KIT } from "#app/components/sheet/paper/dom-kit.tsx";
import { PaperPage } from "#app/components/sheet/paper/PaperPage.tsx";
import { SheetPages } from "#app/components/sheet/paper/SheetPages.tsx";
import type { Paper } from "#app/lib/paper-size.ts";
import { handsOnly } from "#app/lib/sheet/sheet-document-of.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { fontRules, sheetStyles } from "./sheet-fonts.server.ts";

const OWN = "html{background:#fff}body{margin:0}";

/** The file's text: its styles and fonts inside, no script, nothing asked for from outside. */
export async function renderSheetHtml(whole: SheetDocument, paper: Paper, pages: "hands" | "all"): Promise<string> {
  const document = pages === "hands" ? handsOnly(whole) : whole;
  const styles = [await fontRules(), await sheetStyles(), OWN].join("\n");
  const markup = renderToStaticMarkup(
    <html lang={document.language}>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="author" content={document.titleBlock.owner} />
        <title>{document.name}</title>
        <style dangerouslySetInnerHTML={{ __html: styles }} />
      </head>
      <body>
        <main>
          <SheetPages kit={DOM_KIT} document={document} paper={paper} Page={PaperPage} />
        </main>
      </body>
    </html>,
  );
  return `<!doctype html>\n${markup}\n`;
}
