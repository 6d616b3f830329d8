/** @jsxImportSource react */
import { Document, Page, renderToBuffer, Text } from "@react-pdf/renderer";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { handsOnly } from "#app/lib/sheet/sheet-document-of.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";

/** The bytes of the PDF. */
export async function renderSheetPdf(whole: SheetDocument, paper: Paper, pages: "hands" | "all"): Promise<Uint8Array> {
  const document = pages === "hands" ? handsOnly(whole) : whole;
  return renderToBuffer(
    <Document title={document.name} language={document.language}>
      <Page size={paper === "a4" ? "A4" : "LETTER"} wrap={false}>
        <Text>{`${PAPERS[paper].name} ${document.hands.answer}`}</Text>
      </Page>
    </Document>,
  );
}
