import type { Plot, PlotFrame } from "../drawings/plot.ts";
import { plotScale } from "../drawings/plot-scale.ts";
import { seriesValue } from "../drawings/series-value.ts";
import { axisValue, nearestStop } from "./axis-value.ts";

export interface PlotReadOutProps {
  plot: Plot;
  xName: string;
  /** The x that is read. */
  at: number;
  frame: PlotFrame;
  onRead: (x: number) => void;
}

/** Arrow keys go through the axis in this many steps. */
const STEPS = 100;
const THUMB = 12;

/**
 * Reads the curves at one x. The control is a native range laid along the axis: arrow keys, Page keys, touch and screen
 * readers work as everywhere, and the values are its spoken text.
 */
export function PlotReadOut({ plot, xName, at, frame, onRead }: PlotReadOutProps) {
  // One press of an arrow key goes from stop to stop where there are some.
  const steps = plot.x.stops === undefined ? STEPS : plot.x.to - plot.x.from;
  const share = plotScale(plot.x, 0, steps)(at);
  const values = plot.series.flatMap((series) => {
    const value = seriesValue(plot, series, at);
    return value === null ? [] : [{ series, text: plot.y.format(value) }];
  });
  const spoken = [plot.x.format(at), ...values.map(({ series, text }) => `${series.label} ${text}`)].join("; ");
  return (
    <div className="min-h-14 pt-1.5">
      <input
        type="range"
        className="plot-cursor block"
        style={{ marginLeft: frame.left - THUMB / 2, width: frame.right - frame.left + THUMB }}
        min={0}
        max={steps}
        step={1}
        value={Math.round(share)}
        aria-label={`Read along ${xName.toLowerCase()}`}
        aria-valuetext={spoken}
        onChange={(event) => onRead(nearestStop(plot.x, axisValue(plot.x, event.currentTarget.valueAsNumber / steps)))}
      />
      <p className="flex flex-wrap gap-x-4 text-label" aria-hidden="true">
        <b>
          {xName} {plot.x.format(at)}
        </b>
        {values.map(({ series, text }) => (
          <span key={series.id} className="whitespace-nowrap">
            <span className="text-quiet">{series.label}</span> {text}
          </span>
        ))}
      </p>
    </div>
  );
}
