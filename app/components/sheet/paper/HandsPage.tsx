import type { Paper } from "#app/lib/paper-size.ts";
import { frameWidth } from "#app/lib/sheet/paper-geometry.ts";
import type { SheetPage } from "#app/lib/sheet/sheet-plan.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { HandsFoot } from "./HandsFoot.tsx";
import { HandsGroups } from "./HandsGroups.tsx";
import { Record } from "./Record.tsx";
import { HandsAnswer, HandsDeviations, HandsIdentity } from "./HandsHead.tsx";
import type { Kit } from "./kit.ts";

interface Props {
  kit: Kit;
  document: SheetDocument;
  paper: Paper;
  page: SheetPage & { kind: "hands" };
}

/** A page for hands: what this paper is, the answer, what holds the wafer at which steps, and what not to do. */
export function HandsPage({ kit, document, paper, page }: Props) {
  const { hands, diameter } = document;
  const frame = frameWidth(paper);
  return (
    <>
      <HandsIdentity kit={kit} document={document} />
      {page.first ? (
        <>
          <HandsAnswer kit={kit} hands={hands} frame={frame} />
          <HandsDeviations kit={kit} deviations={hands.deviations} />
        </>
      ) : null}
      {page.groups.length > 0 ? (
        <HandsGroups
          kit={kit}
          groups={page.groups}
          frame={frame}
          diameter={diameter}
          exaggeration={hands.exaggeration}
        />
      ) : null}
      {page.record > 0 ? <Record kit={kit} rows={page.record} /> : null}
      {page.foot ? <HandsFoot kit={kit} hands={hands} frame={frame} /> : null}
    </>
  );
}
