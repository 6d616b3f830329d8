import { chooseExaggeration } from "#app/components/drawings/choose-exaggeration.ts";
import type { Paper } from "#app/lib/paper-size.ts";
import { sheetPages } from "#app/lib/sheet-pages.ts";
import type { SheetView } from "#app/lib/sheet-view.ts";
import { GroupTable } from "./GroupTable.tsx";
import { SheetBar } from "./SheetBar.tsx";
import { SheetFoot } from "./SheetFoot.tsx";
import { SheetAnswer, SheetIdentity } from "./SheetHead.tsx";
import { SheetPaper } from "./SheetPaper.tsx";

/** The handling-risk sheet as it prints, with a small bar above it on a screen. */
export function SheetPage({ sheet, paper, printedAt }: { sheet: SheetView; paper: Paper; printedAt: string }) {
  const bows = sheet.groups.flatMap(({ bow }) => (bow.shape.kind === "bowed" ? [bow.shape.bow] : []));
  const exaggeration = chooseExaggeration(bows, sheet.diameter);
  const pages = sheetPages(sheet, paper);
  return (
    <>
      <SheetBar assessmentId={sheet.assessmentId} paper={paper} legs={sheet.legs} />
      <main id="main">
        <div
          className="overflow-x-auto bg-wash py-6 print:overflow-visible print:bg-transparent print:py-0"
          tabIndex={0}
          role="region"
          aria-label="Sheet as it prints"
        >
          {pages.map(({ groups, foot }, index) => (
            <SheetPaper
              key={index}
              paper={paper}
              titleBlock={{ ...sheet.titleBlock, page: `${index + 1} of ${pages.length}` }}
              printedAt={printedAt}
            >
              <SheetIdentity sheet={sheet} />
              {index === 0 ? <SheetAnswer sheet={sheet} /> : null}
              {groups.length > 0 ? (
                <GroupTable groups={groups} diameter={sheet.diameter} exaggeration={exaggeration} />
              ) : null}
              {foot ? <SheetFoot sheet={sheet} /> : null}
            </SheetPaper>
          ))}
        </div>
      </main>
    </>
  );
}
