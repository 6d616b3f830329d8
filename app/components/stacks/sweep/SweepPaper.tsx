import { noBreak } from "#app/components/drawings/no-break.ts";
import { OnePage, PAGE_CELL } from "#app/components/comparison/OnePage.tsx";
import { PaperBar } from "#app/components/comparison/PaperBar.tsx";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { answerOf } from "#app/lib/stack-sweep/answers.ts";
import { sweepSearch } from "#app/lib/stack-sweep/asked.ts";
import type { SweepView, SweptView } from "#app/schemas/stack-sweep.ts";
import { sweepName } from "./sweep-name.ts";
import { SweepPrint } from "./SweepPrint.tsx";

interface Props {
  view: Pick<SweepView, "stack" | "asked"> & { swept: SweptView };
  paper: Paper;
  preparedBy: string;
  /** ISO date and time */
  printedAt: string;
}

/** A millimetre of a drawing that is printed at its own size, px. */
const MM = 96 / 25.4;
const PLOT_HEIGHT = 110;

/** A sweep on one page: the answer, the drawing, and where the limits are reached. */
export function SweepPaper({ view: { stack, asked, swept }, paper, preparedBy, printedAt }: Props) {
  const answer = answerOf(swept.answer);
  const none = swept.drawn.kind === "map" && swept.drawn.without.length > 0 ? ` Ruled: ${answer?.none ?? ""}.` : "";
  return (
    <>
      <PaperBar back={`/stacks/${stack.id}/sweep${sweepSearch(asked)}`} backTo="the sweep" paper={paper} />
      <OnePage
        paper={paper}
        kind={sweepName(swept)}
        answer={swept.summary.join(" ")}
        title={stack.name}
        documentType="Sweep of a stack"
        note={`Nominal values. ${
          swept.drawn.kind === "map" ? "Heavy line: the limit. Ring" : "Dashed: the limit. Filled dot"
        }: as it is. Shaded: curled.${none}`}
        preparedBy={preparedBy}
        printedAt={printedAt}
      >
        <div className="border-b-[0.25mm] border-ink p-[1mm]">
          <SweepPrint swept={swept} width={(PAPERS[paper].width - 34) * MM} height={PLOT_HEIGHT * MM} />
        </div>
        <div className={PAGE_CELL}>
          <p>
            <strong>{stack.name}</strong> ({stack.program})
          </p>
          <ul>
            {[...swept.crossings, ...swept.remarks].map((sentence) => (
              <li key={sentence}>{noBreak(sentence)}</li>
            ))}
          </ul>
        </div>
      </OnePage>
    </>
  );
}
