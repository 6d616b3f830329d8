import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import type { Plot, PlotBand, PlotFrame, PlotScales } from "./plot.ts";

export interface PlotUnderProps {
  plot: Plot;
  frame: PlotFrame;
  scales: PlotScales;
}

const RULE_PITCH = 5;
/** A band over a single place is a bar this wide, px. */
const BAR = 8;

/** What lies under a plot's grid: the shaded regime and stretches, level lines over what was left out, and bands. */
export function PlotUnder({ plot, frame, scales }: PlotUnderProps) {
  const regimeEnd = plot.regime ? Math.min(frame.right, scales.x(plot.regime.upTo)) : frame.left;
  return (
    <>
      {regimeEnd > frame.left ? (
        <rect
          x={frame.left}
          y={frame.top}
          width={coordinate(regimeEnd - frame.left)}
          height={frame.bottom - frame.top}
          fill={colour("wash")}
        />
      ) : null}
      {plot.shaded?.map(({ from, to }) => {
        const [left, right] = [Math.max(frame.left, scales.x(from)), Math.min(frame.right, scales.x(to))];
        return right > left ? (
          <rect
            key={from}
            x={coordinate(left)}
            y={frame.top}
            width={coordinate(right - left)}
            height={frame.bottom - frame.top}
            fill={colour("wash")}
          />
        ) : null;
      })}
      {plot.leftOut?.map(({ from, to }) => {
        const left = Math.max(frame.left, scales.x(from));
        const right = Math.min(frame.right, scales.x(to));
        let rules = "";
        for (let y = frame.top + RULE_PITCH / 2; y < frame.bottom; y += RULE_PITCH) {
          rules += `M${coordinate(left)} ${y}H${coordinate(right)}`;
        }
        return <path key={from} d={rules} stroke={colour("quiet")} strokeWidth="0.8" />;
      })}
      {plot.bands?.flatMap(({ colourToken, runs }) =>
        runs.map((run) => (
          <path
            key={`${colourToken} ${run[0]?.x}`}
            d={bandPath(run, frame, scales)}
            fill={colour(colourToken)}
            fillOpacity="0.22"
          />
        )),
      )}
    </>
  );
}

/** A run of a band as a closed outline, kept inside the frame. */
function bandPath(run: PlotBand["runs"][number], frame: PlotFrame, scales: PlotScales): string {
  const y = (value: number) => coordinate(Math.min(frame.bottom, Math.max(frame.top, scales.y(value))));
  const [only] = run;
  if (run.length === 1 && only)
    return `M${coordinate(scales.x(only.x) - BAR / 2)} ${y(only.low)}h${BAR}V${y(only.high)}h${-BAR}Z`;
  const upper = run.map(({ x, high }) => `${coordinate(scales.x(x))} ${y(high)}`);
  const lower = run.toReversed().map(({ x, low }) => `${coordinate(scales.x(x))} ${y(low)}`);
  return `M${[...upper, ...lower].join("L")}Z`;
}
