import { useId } from "react";
import { colour } from "#app/components/drawings/colour.ts";
import { hatchPath } from "#app/components/drawings/hatch-path.ts";
import { multiples, niceStep, signedTick } from "#app/components/drawings/plot-ticks.ts";
import { HATCH_STYLES, OUTCOME_SIGNS } from "#app/components/drawings/severity.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { WindowDrawing } from "#app/schemas/process-window.ts";

interface Props {
  drawing: WindowDrawing;
  /** names of the axes with their units */
  names: { x: string; y: string };
  label: string;
}

/** A drawing for a width of screen; text is in its own units, which come out as pixels or more down to the narrowest screen. */
interface Size {
  width: number;
  height: number;
  inset: { left: number; right: number; top: number; bottom: number };
  text: number;
  ticks: number;
  /** whether the names of the axes stand beside them; else the drawing's surroundings say them */
  named: boolean;
}

const WIDE: Size = {
  width: 720,
  height: 440,
  inset: { left: 64, right: 16, top: 12, bottom: 44 },
  text: 14,
  ticks: 6,
  named: true,
};

/** Shown 256 px wide on the narrowest phone. */
const NARROW: Size = {
  width: 320,
  height: 320,
  inset: { left: 50, right: 12, top: 10, bottom: 26 },
  text: 15.5,
  ticks: 3,
  named: false,
};

/** The verdict over two inputs: hatched by outcome, the line beyond which it does not run, and what is planned. */
export function WindowPlot({ names, ...props }: Props) {
  return (
    <>
      <div className="max-tablet:hidden">
        <Plot size={WIDE} names={names} {...props} />
      </div>
      <div className="max-w-90 tablet:hidden">
        <p className="text-quiet">Upwards: {names.y}</p>
        <Plot size={NARROW} names={names} {...props} />
        <p className="text-right text-quiet">Along: {names.x}</p>
      </div>
    </>
  );
}

function Plot({ drawing: { x, y, runs, boundary, planned }, names, label, size }: Props & { size: Size }) {
  const id = useId();
  const { width, height, inset } = size;
  const text = { fontSize: size.text, fill: colour("quiet") };
  const plot = { width: width - inset.left - inset.right, height: height - inset.top - inset.bottom };
  const [spanX, spanY] = [spanOf(x), spanOf(y)];
  const atX = (value: number) => inset.left + ((value - spanX.from) / (spanX.to - spanX.from)) * plot.width;
  const atY = (value: number) =>
    inset.top + plot.height - ((value - spanY.from) / (spanY.to - spanY.from)) * plot.height;
  // A place of the grid stands for half a cell to either side of it.
  const cell = { width: plot.width / (x.length - 1), height: plot.height / (y.length - 1) };
  const outcomes = [...new Set(runs.map(({ outcome }) => outcome))];
  const clip = (outcome: Outcome) => `${id}-${outcome.replaceAll(" ", "-")}`;
  const line = (points: readonly { x: number; y: number }[]) =>
    points.map((point, index) => `${index === 0 ? "M" : "L"}${atX(point.x)} ${atY(point.y)}`).join("");
  return (
    <svg viewBox={`0 0 ${width} ${height}`} className="h-auto w-full max-w-220" role="img" aria-label={label}>
      <clipPath id={`${id}-plot`}>
        <rect x={inset.left} y={inset.top} {...plot} />
      </clipPath>
      {outcomes.map((outcome) => {
        const style = HATCH_STYLES[OUTCOME_SIGNS[outcome].level];
        return (
          <g key={outcome} clipPath={`url(#${id}-plot)`}>
            <clipPath id={clip(outcome)}>
              {runs
                .filter((run) => run.outcome === outcome)
                .map(({ row, from, to }) => (
                  <rect
                    key={`${row} ${from}`}
                    x={inset.left + (from - 0.5) * cell.width}
                    y={inset.top + plot.height - (row + 0.5) * cell.height}
                    width={(to - from + 1) * cell.width}
                    // A hair of overlap: rows that only touch leave seams in the hatch.
                    height={cell.height + 0.5}
                  />
                ))}
            </clipPath>
            {style.pitch === null ? null : (
              <g clipPath={`url(#${clip(outcome)})`}>
                <path
                  transform={`translate(${inset.left} ${inset.top})`}
                  d={hatchPath(plot.width, plot.height, style.pitch, style.crossed)}
                  fill="none"
                  stroke={colour(style.colour)}
                  strokeWidth={style.stroke}
                />
              </g>
            )}
          </g>
        );
      })}
      {boundary.map((points) => (
        <path key={line(points)} d={line(points)} fill="none" stroke={colour("stop")} strokeWidth={2} />
      ))}
      <rect x={inset.left} y={inset.top} {...plot} fill="none" stroke={colour("ink")} />
      <g>
        {ticksOf(spanX, size.ticks).map((tick) => (
          <g key={tick}>
            <line
              x1={atX(tick)}
              x2={atX(tick)}
              y1={inset.top + plot.height}
              y2={inset.top + plot.height + 4}
              stroke={colour("ink")}
            />
            <text style={text} x={atX(tick)} y={inset.top + plot.height + 18} textAnchor="middle">
              {signedTick(tick)}
            </text>
          </g>
        ))}
        {ticksOf(spanY, size.ticks).map((tick) => (
          <g key={tick}>
            <line x1={inset.left - 4} x2={inset.left} y1={atY(tick)} y2={atY(tick)} stroke={colour("ink")} />
            <text style={text} x={inset.left - 8} y={atY(tick) + 4} textAnchor="end">
              {signedTick(tick)}
            </text>
          </g>
        ))}
        {size.named ? (
          <>
            <text style={text} x={inset.left + plot.width / 2} y={height - 6} textAnchor="middle">
              {names.x}
            </text>
            <text
              style={text}
              transform={`translate(14 ${inset.top + plot.height / 2}) rotate(-90)`}
              textAnchor="middle"
            >
              {names.y}
            </text>
          </>
        ) : null}
      </g>
      {planned ? (
        <g>
          <circle
            cx={atX(planned.x)}
            cy={atY(planned.y)}
            r={7}
            fill={colour("raised")}
            stroke={colour("ink")}
            strokeWidth={2}
          />
          <circle cx={atX(planned.x)} cy={atY(planned.y)} r={2} fill={colour("ink")} />
        </g>
      ) : null}
    </svg>
  );
}

const spanOf = (values: readonly number[]) => ({ from: values.at(0) ?? 0, to: values.at(-1) ?? 1 });

function ticksOf({ from, to }: { from: number; to: number }, count: number): number[] {
  return multiples(niceStep((to - from) / count), from, to);
}
