import type { ReactNode } from "react";
import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { FRAME_LINE, TITLE_STRIP } from "#app/lib/sheet/paper-geometry.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { mm, PAPER_COLOURS, type Kit } from "./kit.ts";
import { TitleStrip } from "./TitleStrip.tsx";

export interface PageProps {
  kit: Kit;
  document: SheetDocument;
  paper: Paper;
  /** '1 of 2' */
  page: string;
  printedAt?: string | undefined;
  children: ReactNode;
}

/** What every page of the sheet has: filing margin with fold mark, one frame, the title block in its lower right corner. */
export function PageFrame({ kit, document, paper, page, printedAt, children }: PageProps) {
  const { Box } = kit;
  const { width, height } = PAPERS[paper];
  return (
    <>
      <Box
        className="sheet-paper-only"
        style={{
          position: "absolute",
          top: mm(height / 2),
          left: mm(6),
          width: mm(5),
          borderTopWidth: mm(0.2),
          borderColor: PAPER_COLOURS.quiet,
        }}
      />
      <Box
        className="sheet-wide"
        style={{
          width: mm(width - FILING_MARGIN - MARGIN),
          height: mm(height - 2 * MARGIN),
          borderTopWidth: mm(FRAME_LINE),
          borderRightWidth: mm(FRAME_LINE),
          borderBottomWidth: mm(FRAME_LINE),
          borderLeftWidth: mm(FRAME_LINE),
        }}
      >
        <Box style={{ flexGrow: 1 }}>{children}</Box>
        <TitleStrip kit={kit} document={document} page={page} printedAt={printedAt} height={TITLE_STRIP.height} />
      </Box>
    </>
  );
}
