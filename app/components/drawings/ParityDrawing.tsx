import type { PointerEvent } from "react";
import type { Predicted } from "#app/schemas/prediction.ts";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { BAR, parityAxis, type ParityMark } from "./parity-layout.ts";
import type { PlotAxis, PlotFrame } from "./plot.ts";
import { PlotMarker } from "./PlotMarker.tsx";
import { plotScale } from "./plot-scale.ts";
import { roomyTicks } from "./roomy-ticks.ts";
import { useOwnUnits } from "#app/components/units/own-units-context.ts";
import { ownAxis } from "./own-plot.ts";

interface Props {
  of: Predicted;
  marks: readonly ParityMark[];
  /** what the drawing shows, in words */
  label: string;
  /** width and height, px */
  size?: number;
  /** the point that is read out */
  chosen?: string | null;
  /** told the point next to the pointer */
  onPoint?: (id: string) => void;
  className?: string;
}

const TEXT = 12.5;

/**
 * Measured over predicted, both axes in one scale: on the line they agree. Bars are the expanded uncertainties, k = 2. A square is of a
 * group that the model is off at. The same on screen and paper.
 */
export function ParityDrawing({ of, marks, label, size = 520, chosen = null, onPoint, className }: Props) {
  const axis = ownAxis(parityAxis(of, marks), useOwnUnits());
  const frame: PlotFrame = { left: 56, right: size - 12, top: 22, bottom: size - 42 };
  const x = plotScale(axis, frame.left, frame.right);
  const y = plotScale(axis, frame.bottom, frame.top);
  const follow = (event: PointerEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    const [px, py] = [event.clientX - box.left, event.clientY - box.top].map((at) => (at * size) / box.width);
    const near = nearest(marks, (mark) => Math.hypot(x(mark.predicted) - (px ?? 0), y(mark.measured) - (py ?? 0)));
    if (near) onPoint?.(near.id);
  };
  const read = marks.find(({ id }) => id === chosen);
  return (
    <svg
      className={className ?? "block h-auto w-full"}
      viewBox={`0 0 ${size} ${size}`}
      role="img"
      aria-label={label}
      onPointerMove={onPoint && follow}
    >
      {axis.ticks.map((tick) => (
        <path
          key={tick.value}
          d={`M${frame.left} ${coordinate(y(tick.value))}H${frame.right}M${coordinate(x(tick.value))} ${frame.top}V${frame.bottom}`}
          stroke={colour("line")}
        />
      ))}
      <path
        d={`M${coordinate(x(axis.from))} ${coordinate(y(axis.from))}L${coordinate(x(axis.to))} ${coordinate(y(axis.to))}`}
        stroke={colour("ink")}
        strokeDasharray="5 4"
      />
      {marks.map((mark) => (
        <Bars key={mark.id} mark={mark} x={x} y={y} />
      ))}
      {marks.map((mark) => (
        <PlotMarker
          key={mark.id}
          marker={mark.off ? "square" : "circle"}
          x={x(mark.predicted)}
          y={y(mark.measured)}
          colourToken={mark.off ? "stop" : "silicon"}
        />
      ))}
      {read && (
        <path
          d={`M${frame.left} ${coordinate(y(read.measured))}H${coordinate(x(read.predicted))}V${frame.bottom}`}
          fill="none"
          stroke={colour("copper")}
        />
      )}
      {read && (
        <circle cx={coordinate(x(read.predicted))} cy={coordinate(y(read.measured))} r="5" fill={colour("copper")} />
      )}
      <path d={`M${frame.left} ${frame.top}V${frame.bottom}H${frame.right}`} fill="none" stroke={colour("ink")} />
      <Labels axis={axis} frame={frame} size={size} x={x} y={y} />
    </svg>
  );
}

function nearest(marks: readonly ParityMark[], distance: (mark: ParityMark) => number): ParityMark | null {
  return marks.reduce<ParityMark | null>(
    (best, mark) => (best && distance(best) <= distance(mark) ? best : mark),
    null,
  );
}

interface Scales {
  x: (value: number) => number;
  y: (value: number) => number;
}

function Bars({ mark, x, y }: { mark: ParityMark } & Scales) {
  const { predicted, predictedUncertainty, measured, measuredUncertainty } = mark;
  const [left, right] = [x(predicted - BAR * predictedUncertainty), x(predicted + BAR * predictedUncertainty)];
  const [low, high] = [y(measured - BAR * measuredUncertainty), y(measured + BAR * measuredUncertainty)];
  return (
    <path
      d={`M${coordinate(left)} ${coordinate(y(measured))}H${coordinate(right)}M${coordinate(x(predicted))} ${coordinate(low)}V${coordinate(high)}`}
      stroke={colour(mark.off ? "stop" : "silicon")}
      strokeOpacity="0.55"
    />
  );
}

function Labels({ axis, frame, size, x, y }: { axis: PlotAxis; frame: PlotFrame; size: number } & Scales) {
  return (
    <>
      {roomyTicks(axis.ticks, x, TEXT).map((tick) => (
        <text key={tick.value} x={coordinate(x(tick.value))} y={frame.bottom + 17} textAnchor="middle">
          {tick.text}
        </text>
      ))}
      {axis.ticks.map((tick) => (
        <text key={tick.value} x={frame.left - 6} y={coordinate(y(tick.value) + 4)} textAnchor="end">
          {tick.text}
        </text>
      ))}
      <text x={(frame.left + frame.right) / 2} y={size - 6} textAnchor="middle" style={{ fill: colour("quiet") }}>
        {`Predicted, ${axis.title}`}
      </text>
      <text x={4} y={13} style={{ fill: colour("quiet") }}>
        {`Measured, ${axis.title}`}
      </text>
      <text x={frame.right - 26} y={frame.top + 13} textAnchor="end" style={{ fill: colour("quiet") }}>
        {"1 : 1"}
      </text>
    </>
  );
}
