import { noBreak } from "#app/components/drawings/no-break.ts";
import { PrintPlot } from "#app/components/drawings/PrintPlot.tsx";
import { count } from "#app/lib/count-words.ts";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { comparisonSearch, type ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";
import { paperRows, PLOT_HEIGHT } from "#app/lib/stack-comparison/paper-rows.ts";
import type { ComparedView, ComparisonView } from "#app/schemas/stack-comparison.ts";
import { chartName } from "./chart-words.ts";
import { comparisonPlot } from "./comparison-plot.ts";
import { OnePage, PAGE_CELL } from "./OnePage.tsx";
import { PaperBar } from "./PaperBar.tsx";
import { PaperTable } from "./PaperTable.tsx";
import { PlotKey } from "./PlotKey.tsx";

interface Props {
  asked: ComparisonAsked;
  stacks: ComparisonView["stacks"];
  compared: ComparedView;
  paper: Paper;
  preparedBy: string;
  /** ISO date and time */
  printedAt: string;
}

/** A millimetre of a drawing that is printed at its own size, px. */
const MM = 96 / 25.4;

/** A comparison on one page: the answer, the curves, all figures and as many of the inputs that differ as it holds. */
export function ComparisonPaper({ asked, stacks, compared, paper, preparedBy, printedAt }: Props) {
  const { width } = PAPERS[paper];
  const { groups, crossings, moreRows, moreCrossings } = paperRows(compared, stacks.length, paper);
  const plot = comparisonPlot(compared.chart);
  return (
    <>
      <PaperBar back={`/stacks/compare${comparisonSearch(asked)}`} backTo="the comparison" paper={paper} />
      <OnePage
        paper={paper}
        kind={`Comparison of stacks, ${compared.temperature}`}
        answer={compared.summary.join(" ")}
        title={stacks.length === 2 ? "Two stacks side by side" : `${capital(count(stacks.length))} stacks side by side`}
        documentType="Comparison"
        note="Bold: not as in A. Filled dot: own thickness. Bar: begins to curl. ± of a figure: k = 2."
        preparedBy={preparedBy}
        printedAt={printedAt}
      >
        <ul
          className={`grid gap-x-[3mm] border-b-[0.25mm] border-ink tablet:grid-cols-2 print:grid-cols-2 ${PAGE_CELL}`}
        >
          {stacks.map(({ id, letter, name, program }) => (
            <li key={id} className="flex items-center gap-[2mm]">
              <svg width="40" height="10" viewBox="0 -5 40 10" aria-hidden="true" className="flex-none">
                <PlotKey plot={plot} letter={letter} />
              </svg>
              <span>
                <strong>{letter}</strong> {name} ({program})
              </span>
            </li>
          ))}
        </ul>
        <div className="border-b-[0.25mm] border-ink px-[1mm]">
          <PrintPlot
            plot={plot}
            label={chartName(compared.temperature)}
            width={(width - 33) * MM}
            height={PLOT_HEIGHT * MM}
            textSize={10}
          />
        </div>
        <PaperTable stacks={stacks} groups={groups} />
        {moreRows > 0 ? <p className={PAGE_CELL}>{moreRows} more rows on the screen.</p> : null}
        <ul className={PAGE_CELL} aria-label="Where they warp alike">
          {crossings.map(({ key, numbers, sentence }) => (
            <li key={key}>
              {numbers.length > 0 ? <strong>{numbers.join(", ")}: </strong> : null}
              {noBreak(sentence)}
            </li>
          ))}
          {crossings.length === 0 ? <li>No two of them warp alike anywhere in this range.</li> : null}
          {moreCrossings > 0 ? <li>And {count(moreCrossings)} more pairs that cross: see the screen.</li> : null}
        </ul>
      </OnePage>
    </>
  );
}

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);
