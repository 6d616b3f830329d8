import type { CSSProperties } from "react";
import { FILING_MARGIN, MARGIN, PAPERS } from "#app/lib/paper-size.ts";
import { OutlineMark } from "./OutlineMark.tsx";
import { PageFrame, type PageProps } from "./PageFrame.tsx";

/** One sheet of paper in a browser: as large as it is, black on white whatever the theme. */
export function PaperPage(props: PageProps) {
  const { document, paper, page } = props;
  const { width, height } = PAPERS[paper];
  const style: CSSProperties & Record<`--${string}`, string> = {
    "--sheet-height": `${height}mm`,
    width: `${width}mm`,
    height: `${height}mm`,
    paddingTop: `${MARGIN}mm`,
    paddingRight: `${MARGIN}mm`,
    paddingBottom: `${MARGIN}mm`,
    paddingLeft: `${FILING_MARGIN}mm`,
  };
  return (
    <section className={`sheet-paper sheet-page-${paper}`} style={style} aria-label={`Page ${page}`}>
      <PageFrame {...props} />
      {document.mark === null ? null : <OutlineMark words={document.mark} paper={paper} />}
    </section>
  );
}
