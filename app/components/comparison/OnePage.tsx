import type { CSSProperties, ReactNode } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { TitleBlock } from "#app/components/drawings/TitleBlock.tsx";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { SITE_NAME } from "#app/lib/site.ts";

interface Props {
  paper: Paper;
  /** what it is, before 'computed, not released' */
  kind: string;
  /** the answer in words */
  answer: string;
  title: string;
  documentType: string;
  /** how its marks are to be read */
  note: string;
  preparedBy: string;
  /** ISO date and time */
  printedAt: string;
  children: ReactNode;
}

/** Padding of what stands across the page. */
export const PAGE_CELL = "px-[3mm] py-[1.2mm]";

/** Something computed on one page: the answer above, the title block below. */
export function OnePage({ paper, kind, answer, title, documentType, note, preparedBy, printedAt, children }: Props) {
  const { width, height, page } = PAPERS[paper];
  const style: CSSProperties & Record<`--${string}`, string> = { "--width": `${width}mm`, "--height": `${height}mm` };
  return (
    <main id="main" className="overflow-x-auto bg-wash py-6 print:overflow-visible print:bg-transparent print:py-0">
      <div
        className={`paper relative mx-auto box-border flex flex-col py-[10mm] pr-[10mm] pl-[20mm] text-[8.5pt]/[11pt] max-tablet:px-3 tablet:min-h-(--height) tablet:w-(--width) print:min-h-(--height) print:w-(--width) ${page}`}
        style={style}
      >
        <div className="flex flex-1 flex-col border-[0.5mm] border-ink">
          <div className={`border-b-[0.35mm] border-ink ${PAGE_CELL}`}>
            <p>{noBreak(kind)}. Computed, not released: not for the floor</p>
            <h1 className="text-[12pt]/[15pt] font-semibold text-balance">{noBreak(answer)}</h1>
          </div>
          {children}
          <div className="keep-whole mt-auto border-t-[0.35mm] border-ink tablet:grid tablet:grid-cols-[minmax(0,1fr)_112mm] print:grid print:grid-cols-[minmax(0,1fr)_112mm]">
            <p className={PAGE_CELL}>
              <strong>Uncontrolled when printed.</strong> {noBreak(note)} Printed{" "}
              {printedAt.slice(0, 16).replace("T", " ")} UTC.
            </p>
            <div className="border-ink max-tablet:border-t tablet:border-l-[0.35mm] print:border-l-[0.35mm] [&_.title-block]:bg-transparent">
              <TitleBlock
                variant="paper"
                fields={{
                  owner: SITE_NAME,
                  documentType,
                  title,
                  prepared: preparedBy,
                  checked: "not yet",
                  released: "not yet",
                  number: "–",
                  revision: "–",
                  status: "Draft",
                  date: printedAt.slice(0, 10),
                  language: "en",
                  page: "1 of 1",
                }}
              />
            </div>
          </div>
        </div>
      </div>
    </main>
  );
}
