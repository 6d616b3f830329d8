import { ChartFigure } from "#app/components/charts/ChartFigure.tsx";
import { individualsPlot, rangesPlot } from "#app/components/drawings/stress-chart-plot.ts";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import { UNNAMED } from "#app/lib/stress-values.ts";
import type { StressChart } from "#app/schemas/film-stress.ts";

/** Individual values and moving ranges of one instrument, and what the tests of drift say of them. */
export function StressCharts({ chart }: { chart: StressChart }) {
  const { instrument, values, limits } = chart;
  const by = instrument || UNNAMED;
  return (
    <>
      <Signals chart={chart} />
      {values.length > 1 && (
        <div className="grid border-t border-line wide:grid-cols-2">
          <section className="min-w-0 p-4 tablet:p-6" aria-labelledby="individuals">
            <h3 id="individuals" className="mb-2 font-semibold">
              Individual values, {by}
            </h3>
            <ChartFigure
              plot={individualsPlot(chart)}
              label={`Stress of each value, ${by}`}
              summary={`Circle: counts. Triangle: set aside. Square: named by a test above. Bars: ± of the value, k = 2.${limits ? " Limits: centre ± 2.66 mean moving ranges." : ""}`}
              xName="Value"
            />
          </section>
          <section
            className="min-w-0 border-line p-4 max-wide:border-t tablet:p-6 wide:border-l"
            aria-labelledby="ranges"
          >
            <h3 id="ranges" className="mb-2 font-semibold">
              Moving range, {by}
            </h3>
            <ChartFigure
              plot={rangesPlot(chart)}
              label={`Moving range of each value, ${by}`}
              summary={`From each value to the one before it that counts.${limits ? " Limit: 3.267 mean moving ranges." : ""}`}
              xName="Value"
            />
          </section>
        </div>
      )}
      {chart.working && (
        <details className="screen-only border-t border-line p-4 tablet:px-6">
          <summary className="link w-fit cursor-pointer">Working of the limits</summary>
          <div className="mt-2 max-w-[60em]">
            <WorkingView working={chart.working} level={3} />
          </div>
        </details>
      )}
    </>
  );
}

/** What the tests say, in words. A value beyond the limits is proposed, never set aside by itself. */
function Signals({ chart: { signals, limits, tooFew } }: { chart: StressChart }) {
  const beyond = signals.some(({ rule }) => rule === "beyond the limits");
  return (
    <div className="border-t border-line p-4 tablet:px-6">
      <h3 className="font-semibold">Drift</h3>
      {tooFew && <p className="mt-1 text-quiet">{tooFew}</p>}
      {limits && signals.length === 0 && (
        <p className="mt-1">
          No test names a value: the process is steady as far as {limits.from} values tell.
          {limits.from < LOOSE ? " Below twenty the limits are still loose." : ""}
        </p>
      )}
      {signals.length > 0 && (
        <ul className="mt-1 max-w-[60em] list-disc pl-5">
          {signals.map(({ sentence }) => (
            <li key={sentence}>{sentence}</li>
          ))}
        </ul>
      )}
      {signals.length > 0 && (
        <p className="mt-1 max-w-[60em] text-quiet">
          {beyond
            ? "A value beyond the limits may be an outlier: it counts until somebody sets it aside with a reason. "
            : ""}
          On a steady process these tests name something about once in 55 values. Values are numbered as in the list.
        </p>
      )}
    </div>
  );
}

const LOOSE = 20;
