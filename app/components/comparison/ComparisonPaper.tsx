import { noBreak } from "#app/components/drawings/no-break.ts";
import type { Plot } from "#app/components/drawings/plot.ts";
import { PrintPlot } from "#app/components/drawings/PrintPlot.tsx";
import { count } from "#app/lib/count-words.ts";
import { comparisonSearch, type ComparisonAsked } from "#app/lib/comparison/asked.ts";
import { comparisonPath, type ComparedKind } from "#app/lib/comparison/kinds.ts";
import { paperRows, PLOT_HEIGHT } from "#app/lib/comparison/paper-rows.ts";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import type { ComparedMember, ComparedWords } from "#app/schemas/comparison.ts";
import { OnePage, PAGE_CELL } from "./OnePage.tsx";
import { PaperBar } from "./PaperBar.tsx";
import { PaperTable } from "./PaperTable.tsx";
import { PlotKey } from "./PlotKey.tsx";

/** What the page is printed from, and by whom. */
export interface Printed {
  paper: Paper;
  preparedBy: string;
  /** ISO date and time */
  printedAt: string;
}

interface Props extends Printed {
  kind: ComparedKind;
  asked: ComparisonAsked;
  members: readonly ComparedMember[];
  compared: ComparedWords;
  plot: Plot;
  /** what the chart shows */
  chartName: string;
  /** what it is, before 'computed, not released' */
  head: string;
  /** how its marks are to be read */
  note: string;
  /** what the rows of the table are */
  caption: string;
  /** how many groups of rows, which come first, are figures: they are printed whole before the rest */
  figureGroups: number;
}

/** A millimetre of a drawing that is printed at its own size, px. */
const MM = 96 / 25.4;

/** A comparison on one page: the answer, the chart, all figures and as much of what differs as it holds. */
export function ComparisonPaper(props: Props) {
  const { kind, asked, members, compared, plot, chartName, paper, caption, figureGroups } = props;
  const { width } = PAPERS[paper];
  const answer = compared.summary.join(" ");
  const { groups, crossings, moreRows, moreCrossings } = paperRows(compared, {
    names: members.map(({ letter, name, program }) => `${letter} ${name} (${program})`),
    figureGroups,
    paper,
    answer,
  });
  return (
    <>
      <PaperBar back={`${comparisonPath(kind)}${comparisonSearch(asked)}`} backTo="the comparison" paper={paper} />
      <OnePage
        paper={paper}
        kind={props.head}
        answer={answer}
        title={`${capital(count(members.length))} ${kind.many} side by side`}
        documentType="Comparison"
        note={props.note}
        preparedBy={props.preparedBy}
        printedAt={props.printedAt}
      >
        <ul
          className={`grid gap-x-[3mm] border-b-[0.25mm] border-ink tablet:grid-cols-2 print:grid-cols-2 ${PAGE_CELL}`}
        >
          {members.map(({ id, letter, name, program }) => (
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
          <PrintPlot plot={plot} label={chartName} width={(width - 33) * MM} height={PLOT_HEIGHT * MM} textSize={10} />
        </div>
        <PaperTable members={members} groups={groups} caption={caption} />
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
