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

const WIDTH = 720;
const HEIGHT = 440;
const INSET = { left: 64, right: 16, top: 12, bottom: 44 };
const TICKS = 6;

/** The verdict over two inputs: hatched by outcome, the line beyond which it does not run, and what is planned. */
export function WindowPlot({ drawing: { x, y, runs, boundary, planned }, names, label }: Props) {
  const id = useId();
  const plot = { width: WIDTH - INSET.left - INSET.right, height: HEIGHT - INSET.top - INSET.bottom };
  const [spanX, spanY] = [spanOf(x), spanOf(y)];
  const atX = (value: number) => INSET.left + ((value - spanX.from) / (spanX.to - spanX.from)) * plot.width;
  const atY = (value: number) =>
    INSET.top + plot.height - ((value - spanY.from) / (spanY.to - spanY.from)) * plot.height;
  // A place of the grid stands for half a cell to either side of it.
  const cell = { width: plot.width / (x.length - 1), height: plot.height / (y.length - 1) };
  const outcomes = [...new Set(runs.map(({ outcome }) => outcome))];
  const clip = (outcome: Outcome) => `${id}-${outcome.replaceAll(" ", "-")}`;
  const line = (points: readonly { x: number; y: number }[]) =>
    points.map((point, index) => `${index === 0 ? "M" : "L"}${atX(point.x)} ${atY(point.y)}`).join("");
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className="h-auto w-full max-w-220" role="img" aria-label={label}>
      <clipPath id={`${id}-plot`}>
        <rect x={INSET.left} y={INSET.top} {...plot} />
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
                    x={INSET.left + (from - 0.5) * cell.width}
                    y={INSET.top + plot.height - (row + 0.5) * cell.height}
                    width={(to - from + 1) * cell.width}
                    // A hair of overlap: rows that only touch leave seams in the hatch.
                    height={cell.height + 0.5}
                  />
                ))}
            </clipPath>
            {style.pitch === null ? null : (
              <g clipPath={`url(#${clip(outcome)})`}>
                <path
                  transform={`translate(${INSET.left} ${INSET.top})`}
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
      <rect x={INSET.left} y={INSET.top} {...plot} fill="none" stroke={colour("ink")} />
      <g fontSize={12.5} fill={colour("quiet")}>
        {ticksOf(spanX).map((tick) => (
          <g key={tick}>
            <line
              x1={atX(tick)}
              x2={atX(tick)}
              y1={INSET.top + plot.height}
              y2={INSET.top + plot.height + 4}
              stroke={colour("ink")}
            />
            <text x={atX(tick)} y={INSET.top + plot.height + 18} textAnchor="middle">
              {signedTick(tick)}
            </text>
          </g>
        ))}
        {ticksOf(spanY).map((tick) => (
          <g key={tick}>
            <line x1={INSET.left - 4} x2={INSET.left} y1={atY(tick)} y2={atY(tick)} stroke={colour("ink")} />
            <text x={INSET.left - 8} y={atY(tick) + 4} textAnchor="end">
              {signedTick(tick)}
            </text>
          </g>
        ))}
        <text x={INSET.left + plot.width / 2} y={HEIGHT - 6} textAnchor="middle">
          {names.x}
        </text>
        <text transform={`translate(14 ${INSET.top + plot.height / 2}) rotate(-90)`} textAnchor="middle">
          {names.y}
        </text>
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

function ticksOf({ from, to }: { from: number; to: number }): number[] {
  return multiples(niceStep((to - from) / TICKS), from, to);
}
