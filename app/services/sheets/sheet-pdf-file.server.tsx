/** @jsxImportSource react */
import { Document, Page, Path, renderToBuffer, Svg, View } from "@react-pdf/renderer";
import { openSync, type Font as OutlineFont, type GlyphRun } from "fontkit";
import { PageFrame, type PageProps } from "#app/components/sheet/paper/PageFrame.tsx";
import { SheetPages } from "#app/components/sheet/paper/SheetPages.tsx";
import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { MARK_LINE, markPlace } from "#app/lib/sheet/mark-place.ts";
import { handsOnly } from "#app/lib/sheet/sheet-document-of.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { FONT_FAMILIES, registerFonts } from "./pdf-fonts.server.ts";
import { PDF_KIT } from "./pdf-kit.server.tsx";
import { fontFile } from "./sheet-fonts.server.ts";

const POINTS = 72 / 25.4;

/** The bytes of the PDF; those of the same document are the same whenever it is drawn. */
export async function renderSheetPdf(whole: SheetDocument, paper: Paper, pages: "hands" | "all"): Promise<Uint8Array> {
  registerFonts();
  const document = pages === "hands" ? handsOnly(whole) : whole;
  const made = new Date(document.dated);
  const file = await renderToBuffer(
    <Document
      title={document.name}
      author={document.titleBlock.owner}
      subject={document.titleBlock.title}
      language={document.language}
      creator="Planeward"
      producer="Planeward"
      creationDate={made}
      modificationDate={made}
      pdfVersion="1.7"
    >
      <SheetPages kit={PDF_KIT} document={document} paper={paper} Page={PdfPage} />
    </Document>,
  );
  return new Uint8Array(file);
}

function PdfPage(props: PageProps) {
  const { document, paper } = props;
  const { width, height } = PAPERS[paper];
  return (
    <Page
      size={[width * POINTS, height * POINTS]}
      wrap={false}
      style={{
        fontFamily: FONT_FAMILIES,
        fontSize: 11,
        color: "#000000",
        paddingTop: `${MARGIN}mm`,
        paddingRight: `${MARGIN}mm`,
        // A page that is not to be parted is as high as what it holds.
        paddingBottom: `${MARGIN}mm`,
        paddingLeft: `${FILING_MARGIN}mm`,
      }}
    >
      <PageFrame {...props} />
      {document.mark === null ? null : <Mark words={document.mark} paper={paper} />}
    </Page>
  );
}

let outlines: OutlineFont | null = null;

/** The words across a page as outlines of their letters: a PDF's own text is always filled. */
function Mark({ words, paper }: { words: string; paper: Paper }) {
  outlines ??= openSync(fontFile("latin", 600, "woff")) as OutlineFont;
  const run = outlines.layout(words);
  const { x, y, angle, size } = markPlace(paper, run.advanceWidth / outlines.unitsPerEm);
  const scale = size / outlines.unitsPerEm;
  const { width, height } = PAPERS[paper];
  const turned = `translate(${x} ${y}) rotate(${angle}) translate(${(-run.advanceWidth * scale) / 2} ${size * 0.26})`;
  const letters = placedLetters(run).map(({ d, at }) => (
    <Path
      key={at}
      d={d}
      transform={`${turned} scale(${scale} ${-scale}) translate(${at} 0)`}
      fill="none"
      stroke="#000000"
      strokeWidth={MARK_LINE / scale}
    />
  ));
  return (
    <View style={{ position: "absolute", top: 0, left: 0, width: `${width}mm`, height: `${height}mm` }}>
      <Svg viewBox={`0 0 ${width} ${height}`} style={{ width: `${width}mm`, height: `${height}mm` }}>
        {letters}
      </Svg>
    </View>
  );
}

/** The outline of each letter with its place along the line, in units of the typeface. */
function placedLetters({ glyphs, positions }: GlyphRun): { d: string; at: number }[] {
  let along = 0;
  return glyphs.map((glyph, index) => {
    const at = along;
    along += positions[index]?.xAdvance ?? glyph.advanceWidth;
    return { d: glyph.path.toSVG(), at };
  });
}
