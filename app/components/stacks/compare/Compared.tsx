import { noBreak } from "#app/components/drawings/no-break.ts";
import { ChartFigure } from "#app/components/charts/ChartFigure.tsx";
import type { ComparedView, ComparisonView } from "#app/schemas/stack-comparison.ts";
import { chartName } from "./chart-words.ts";
import { comparisonPlot } from "./comparison-plot.ts";
import { CompareOptions } from "./CompareOptions.tsx";
import { Crossings } from "./Crossings.tsx";
import { DifferenceTable } from "./DifferenceTable.tsx";
import { Sensitivities } from "./Sensitivities.tsx";

const SECTION = "border-t border-ink p-4 tablet:px-6";

/** The answer, the curves and where they cross, what differs, and what moves each warp. */
export function Compared({ view, compared }: { view: ComparisonView; compared: ComparedView }) {
  const { temperature, summary, chart, groups, sensitivities, crossings } = compared;
  const plot = comparisonPlot(chart);
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
          {noBreak(chartName(temperature))}
        </h2>
        <CompareOptions view={view} faults={compared.faults} />
        {plot.series.length === 0 ? (
          <p className="text-quiet">None of them warps enough in this range for a curve to be drawn.</p>
        ) : (
          <ChartFigure
            plot={plot}
            label={chartName(temperature)}
            summary="Filled dot: its own thickness. Upright bar: where it begins to curl; the shaded stretch left of it is curled about one axis. Numbered ring: two warp alike. A curve ends where the roll passes half a turn. Gravity is left out."
            xName="Silicon thickness"
          />
        )}
      </section>
      <section className={SECTION} aria-labelledby="crossings">
        <h2 id="crossings" className="font-semibold">
          Where they warp alike
        </h2>
        <Crossings crossings={crossings} />
      </section>
      <section className={SECTION} aria-labelledby="differences">
        <DifferenceTable asked={view.asked} stacks={view.stacks} groups={groups} />
      </section>
      <section className={SECTION} aria-labelledby="sensitivities">
        <h2 id="sensitivities" className="font-semibold">
          What moves the warp most
        </h2>
        <p className="text-quiet">
          At its own thickness, {noBreak(temperature)}: how far each input’s tolerance moves the warp to either side, to
          first order, the five largest. Bars of all stacks have one scale.
        </p>
        <Sensitivities stacks={sensitivities} />
      </section>
    </article>
  );
}
