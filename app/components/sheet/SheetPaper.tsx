import type { CSSProperties, ReactNode } from "react";
import { TitleBlock, type TitleBlockFields } from "#app/components/drawings/TitleBlock.tsx";
import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { DraftMark } from "./DraftMark.tsx";
import { Emergency } from "./Emergency.tsx";

interface Props {
  paper: Paper;
  titleBlock: TitleBlockFields;
  printedAt: string;
  children: ReactNode;
}

/** One page: filing margin with fold mark, one frame, the title block in its lower right corner. */
export function SheetPaper({ paper, titleBlock, printedAt, children }: Props) {
  const { width, height, page } = PAPERS[paper];
  const style: CSSProperties & Record<`--${string}`, string> = {
    "--width": `${width}mm`,
    "--height": `${height}mm`,
  };
  return (
    <section
      className={`paper relative mx-auto box-border flex break-after-page flex-col py-[10mm] pr-[10mm] pl-[20mm] text-[11pt]/[14pt] not-last:mb-6 last:break-after-auto max-tablet:px-3 tablet:min-h-(--height) tablet:w-(--width) print:mb-0! print:min-h-(--height) print:w-(--width) ${page}`}
      style={style}
      aria-label={`Page ${titleBlock.page}`}
    >
      <span
        className="absolute top-1/2 left-[6mm] w-[5mm] border-t-[0.2mm] border-edge max-tablet:hidden"
        aria-hidden="true"
      />
      <div className="relative flex flex-1 flex-col border-[0.5mm] border-ink">
        <DraftMark width={width - FILING_MARGIN - MARGIN} height={height - 2 * MARGIN} />
        {children}
        <div className="keep-whole mt-auto border-t-[0.35mm] border-ink tablet:grid tablet:grid-cols-[minmax(0,1fr)_112mm]">
          <div className="flex flex-col justify-between gap-[1mm] py-[1mm] pr-[2mm] pl-[3mm]">
            <Emergency />
            <p className="mt-auto text-[9pt]/[11pt]">
              <strong>Uncontrolled when printed.</strong> Page {titleBlock.page}. Printed{" "}
              {printedAt.slice(0, 16).replace("T", " ")} UTC.
            </p>
          </div>
          {/* The block's own ground, snapped to whole pixels, would print over the line of the frame. */}
          <div className="border-ink max-tablet:border-t tablet:border-l-[0.35mm] [&_.title-block]:bg-transparent">
            <TitleBlock fields={titleBlock} variant="paper" label={`Title block, page ${titleBlock.page}`} />
          </div>
        </div>
      </div>
    </section>
  );
}
