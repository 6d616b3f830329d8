import { memo, type ReactNode } from "react";
import { WarpChart } from "#app/components/charts/WarpChart.tsx";
import { useCsvMark } from "#app/components/units/own-units-context.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { warpChart, type ChartOthers } from "#app/lib/stack-chart.ts";
import { stackCsv } from "#app/lib/stack-csv.ts";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import { comparisonSentences, lengthWords, thicknessWords } from "#app/lib/stack-words.ts";

interface Props {
  name: string;
  panel: StackPanel;
  overlay: ChartOthers["overlay"];
  limits: SiteLimits;
  /** what else is to be shown */
  options: ReactNode;
}

/** Warp against silicon thickness, with whatever is laid over it and what differs in words. */
export function StackChart({ name, panel, overlay, limits, options }: Props) {
  return (
    <section className="border-t border-line px-4 py-4 tablet:px-6" aria-labelledby="chart">
      <div className="mb-2 flex flex-wrap items-baseline justify-between gap-x-4">
        <h3 id="chart" className="font-semibold">
          Warp against silicon thickness, free wafer
        </h3>
        <CsvLink name={name} panel={panel} overlay={overlay} />
      </div>
      {options}
      <WarpCurves panel={panel} overlay={overlay} limits={limits} />
    </section>
  );
}

/** The figures of the chart as a file. */
const CsvLink = memo(function CsvLink({
  name,
  panel: { room, hot },
  overlay,
}: Pick<Props, "name" | "panel" | "overlay">) {
  const mark = useCsvMark();
  return (
    <a
      href={dataAddress(stackCsv(name, room, { hot, overlay }, mark))}
      download={`${fileName(name)}-warp.csv`}
      className="link text-label"
    >
      Figures as CSV
    </a>
  );
});

/** Drawn anew only for other figures: a chart takes longer than a key. */
const WarpCurves = memo(function WarpCurves({ panel, overlay, limits }: Pick<Props, "panel" | "overlay" | "limits">) {
  const { room, hot } = panel;
  const data = warpChart(room, { hot, overlay }, limits);
  const at = thicknessWords(room.request.wafer.thickness_m);
  return (
    <>
      {data ? (
        <WarpChart
          data={data}
          label="Warp against silicon thickness, free wafer"
          summary={`At ${at} the free wafer’s warp is ${lengthWords(room.answer.shape.warp_m)}. Gravity is left out; ‘linear’ is Stoney’s formula.`}
        />
      ) : (
        <p className="text-quiet">
          It stays flat within {lengthWords(limits.flatWithin.value)} at every thickness, so there is no curve to draw.
        </p>
      )}
      {overlay && (
        <p className="mt-3">
          {comparisonSentences(room, overlay, limits).map((sentence) => (
            <span key={sentence} className="block">
              {sentence}
            </span>
          ))}
        </p>
      )}
    </>
  );
});

/** The file itself as an address, so that it is there without scripts and always of the figures on the screen. */
const dataAddress = (csv: string) => `data:text/csv;charset=utf-8,${encodeURIComponent(csv)}`;

const fileName = (name: string) =>
  name
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, "-")
    .replace(/^-|-$/g, "") || "stack";
