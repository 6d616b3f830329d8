import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import type { Plot, PlotFrame, PlotScales } from "./plot.ts";

export interface PlotUnderProps {
  plot: Plot;
  frame: PlotFrame;
  scales: PlotScales;
}

const RULE_PITCH = 5;

/** What lies under a plot's grid: the shaded regime, and level lines over what was left out. */
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
      {plot.leftOut?.map(({ from, to }) => {
        const left = Math.max(frame.left, scales.x(from));
        const right = Math.min(frame.right, scales.x(to));
        let rules = "";
        for (let y = frame.top + RULE_PITCH / 2; y < frame.bottom; y += RULE_PITCH) {
          rules += `M${coordinate(left)} ${y}H${coordinate(right)}`;
        }
        return <path key={from} d={rules} stroke={colour("quiet")} strokeWidth="0.8" />;
      })}
    </>
  );
}
