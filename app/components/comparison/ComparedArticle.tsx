import type { ReactNode } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { ComparisonAsked } from "#app/lib/comparison/asked.ts";
import type { ComparedMember, ComparedWords } from "#app/schemas/comparison.ts";
import { Crossings } from "./Crossings.tsx";
import { DifferenceTable } from "./DifferenceTable.tsx";
import { Sensitivities } from "./Sensitivities.tsx";

interface Props {
  asked: ComparisonAsked;
  members: readonly ComparedMember[];
  compared: ComparedWords;
  /** what the chart shows */
  chartName: string;
  /** the form of how to compare, and the chart */
  chart: ReactNode;
  /** name of the table, and how its marks are to be read */
  table: { caption: string; note: string };
  /** what the ranking of inputs ranks, and how */
  movers: { title: string; note: string };
}

const SECTION = "border-t border-ink p-4 tablet:px-6";

/** The answer, the chart and where its lines cross, what differs, and what moves each warp. */
export function ComparedArticle({ asked, members, compared, chartName, chart, table, movers }: Props) {
  const { summary, groups, sensitivities, crossings } = compared;
  return (
    <article className="frame max-tablet:-mx-4 max-tablet:border-x-0">
      <h2 className="p-4 text-figure font-medium text-pretty tablet:px-6">
        {summary.map((sentence) => (
          <span key={sentence} className="block">
            {noBreak(sentence)}{" "}
          </span>
        ))}
      </h2>
      <section className={SECTION} aria-labelledby="curves">
        <h2 id="curves" className="mb-2 font-semibold">
          {noBreak(chartName)}
        </h2>
        {chart}
      </section>
      <section className={SECTION} aria-labelledby="crossings">
        <h2 id="crossings" className="font-semibold">
          Where they warp alike
        </h2>
        <Crossings crossings={crossings} />
      </section>
      <section className={SECTION} aria-labelledby="differences">
        <DifferenceTable asked={asked} members={members} groups={groups} {...table} />
      </section>
      <section className={SECTION} aria-labelledby="sensitivities">
        <h2 id="sensitivities" className="font-semibold">
          {movers.title}
        </h2>
        <p className="text-quiet">{noBreak(movers.note)}</p>
        <Sensitivities of={sensitivities} />
      </section>
    </article>
  );
}
