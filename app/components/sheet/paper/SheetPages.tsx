import type { Paper } from "#app/lib/paper-size.ts";
import { sheetPlan } from "#app/lib/sheet/sheet-plan.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { EngineersPage } from "./EngineersPage.tsx";
import { HandsPage } from "./HandsPage.tsx";
import type { Kit } from "./kit.ts";
import type { PageProps } from "./PageFrame.tsx";

interface Props {
  kit: Kit;
  document: SheetDocument;
  paper: Paper;
  /** ISO date-time of this print; a file, which may be printed at any time, has none */
  printedAt?: string;
  /** what wraps a page: a sheet of paper in a browser, a page of a PDF */
  Page: React.ComponentType<PageProps>;
}

/** All pages of a sheet, in their order. */
export function SheetPages({ kit, document, paper, printedAt, Page }: Props) {
  const pages = sheetPlan(document, paper);
  return pages.map((page, index) => (
    <Page
      key={index}
      kit={kit}
      document={document}
      paper={paper}
      page={`${index + 1} of ${pages.length}`}
      printedAt={printedAt}
    >
      {page.kind === "hands" ? (
        <HandsPage kit={kit} document={document} paper={paper} page={page} />
      ) : (
        document.engineers && (
          <EngineersPage kit={kit} document={document} engineers={document.engineers} paper={paper} page={page} />
        )
      )}
    </Page>
  ));
}
