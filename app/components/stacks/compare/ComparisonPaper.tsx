import type { CSSProperties } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PrintPlot } from "#app/components/drawings/PrintPlot.tsx";
import { TitleBlock } from "#app/components/drawings/TitleBlock.tsx";
import { count } from "#app/lib/count-words.ts";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { SITE_NAME } from "#app/lib/site.ts";
import type { ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";
import { paperRows, PLOT_HEIGHT } from "#app/lib/stack-comparison/paper-rows.ts";
import type { ComparedView, ComparisonView } from "#app/schemas/stack-comparison.ts";
import { chartName } from "./chart-words.ts";
import { comparisonPlot } from "./comparison-plot.ts";
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
const CELL = "px-[3mm] py-[1.2mm]";

/** A comparison on one page: the answer, the curves, all figures and as many of the inputs that differ as it holds. */
export function ComparisonPaper({ asked, stacks, compared, paper, preparedBy, printedAt }: Props) {
  const { width, height, page } = PAPERS[paper];
  const { groups, crossings, moreRows, moreCrossings } = paperRows(compared, stacks.length, paper);
  const plot = comparisonPlot(compared.chart);
  const style: CSSProperties & Record<`--${string}`, string> = { "--width": `${width}mm`, "--height": `${height}mm` };
  return (
    <>
      <PaperBar asked={asked} paper={paper} />
      <main id="main" className="overflow-x-auto bg-wash py-6 print:overflow-visible print:bg-transparent print:py-0">
        <div
          className={`paper relative mx-auto box-border flex flex-col py-[10mm] pr-[10mm] pl-[20mm] text-[8.5pt]/[11pt] max-tablet:px-3 tablet:min-h-(--height) tablet:w-(--width) print:min-h-(--height) print:w-(--width) ${page}`}
          style={style}
        >
          <div className="flex flex-1 flex-col border-[0.5mm] border-ink">
            <div className={`border-b-[0.35mm] border-ink ${CELL}`}>
              <p>Comparison of stacks, {noBreak(compared.temperature)}. Computed, not released: not for the floor</p>
              <h1 className="text-[12pt]/[15pt] font-semibold text-balance">{noBreak(compared.summary.join(" "))}</h1>
            </div>
            <ul
              className={`grid gap-x-[3mm] border-b-[0.25mm] border-ink tablet:grid-cols-2 print:grid-cols-2 ${CELL}`}
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
            {moreRows > 0 ? <p className={CELL}>{moreRows} more rows on the screen.</p> : null}
            <ul className={CELL} aria-label="Where they warp alike">
              {crossings.map(({ key, numbers, sentence }) => (
                <li key={key}>
                  {numbers.length > 0 ? <strong>{numbers.join(", ")}: </strong> : null}
                  {noBreak(sentence)}
                </li>
              ))}
              {crossings.length === 0 ? <li>No two of them warp alike anywhere in this range.</li> : null}
              {moreCrossings > 0 ? <li>And {count(moreCrossings)} more pairs that cross: see the screen.</li> : null}
            </ul>
            <div className="keep-whole mt-auto border-t-[0.35mm] border-ink tablet:grid tablet:grid-cols-[minmax(0,1fr)_112mm] print:grid print:grid-cols-[minmax(0,1fr)_112mm]">
              <p className={CELL}>
                <strong>Uncontrolled when printed.</strong> Bold: not as in A. Filled dot: own thickness. Bar: begins to
                curl. ± of a figure: k&nbsp;=&nbsp;2. Printed {printedAt.slice(0, 16).replace("T", " ")} UTC.
              </p>
              <div className="border-ink max-tablet:border-t tablet:border-l-[0.35mm] print:border-l-[0.35mm] [&_.title-block]:bg-transparent">
                <TitleBlock
                  variant="paper"
                  fields={{
                    owner: SITE_NAME,
                    documentType: "Comparison",
                    title:
                      stacks.length === 2
                        ? "Two stacks side by side"
                        : `${capital(count(stacks.length))} stacks side by side`,
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
    </>
  );
}

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);
