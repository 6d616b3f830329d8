import type { LegsView } from "#app/lib/assessment-leg.ts";
import type { Paper } from "#app/lib/paper-size.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { DOM_KIT } from "./paper/dom-kit.tsx";
import { PaperPage } from "./paper/PaperPage.tsx";
import { SheetPages } from "./paper/SheetPages.tsx";
import { SheetBar } from "./SheetBar.tsx";

interface Props {
  assessmentId: string;
  document: SheetDocument;
  legs: LegsView | null;
  paper: Paper;
  /** ISO date-time */
  printedAt: string;
}

/** The draft of a handling-risk sheet as it prints, with a small bar above it on a screen. */
export function SheetPage({ assessmentId, document, legs, paper, printedAt }: Props) {
  return (
    <>
      <SheetBar assessmentId={assessmentId} paper={paper} legs={legs} />
      <main id="main">
        <div
          className="overflow-x-auto bg-wash py-6 print:overflow-visible print:bg-transparent print:py-0"
          tabIndex={0}
          role="region"
          aria-label="Sheet as it prints"
        >
          <SheetPages kit={DOM_KIT} document={document} paper={paper} printedAt={printedAt} Page={PaperPage} />
        </div>
      </main>
    </>
  );
}
