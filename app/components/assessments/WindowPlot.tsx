import { useId } from "react";
import { colour } from "#app/components/drawings/colour.ts";
import { hatchPath } from "#app/components/drawings/hatch-path.ts";
import { planeBox, planePath, type PlaneSize } from "#app/components/drawings/plane.ts";
import { PlaneAxes } from "#app/components/drawings/PlaneAxes.tsx";
import { PlaneFigure } from "#app/components/drawings/PlaneFigure.tsx";
import { PlaneMark } from "#app/components/drawings/PlaneMark.tsx";
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

/** The verdict over two inputs: hatched by outcome, the line beyond which it does not run, and what is planned. */
export function WindowPlot(props: Props) {
  return <PlaneFigure names={props.names}>{(size) => <Plot {...props} size={size} />}</PlaneFigure>;
}

function Plot({ drawing: { x, y, runs, boundary, planned }, names, label, size }: Props & { size: PlaneSize }) {
  const id = useId();
  const box = planeBox(size);
  const [spanX, spanY] = [spanOf(x), spanOf(y)];
  const inShares = (point: { x: number; y: number }) => ({ x: spanX.shareOf(point.x), y: spanY.shareOf(point.y) });
  // A place of the grid stands for half a cell to either side of it.
  const cell = { width: box.width / (x.length - 1), height: box.height / (y.length - 1) };
  const outcomes = [...new Set(runs.map(({ outcome }) => outcome))];
  const clip = (outcome: Outcome) => `${id}-${outcome.replaceAll(" ", "-")}`;
  const at = planned && inShares(planned);
  return (
    <svg viewBox={`0 0 ${size.width} ${size.height}`} className="h-auto w-full max-w-220" role="img" aria-label={label}>
      <clipPath id={`${id}-plot`}>
        <rect x={box.left} y={box.top} width={box.width} height={box.height} />
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
                    x={box.left + (from - 0.5) * cell.width}
                    y={box.bottom - (row + 0.5) * cell.height}
                    width={(to - from + 1) * cell.width}
                    // A hair of overlap: rows that only touch leave seams in the hatch.
                    height={cell.height + 0.5}
                  />
                ))}
            </clipPath>
            {style.pitch === null ? null : (
              <g clipPath={`url(#${clip(outcome)})`}>
                <path
                  transform={`translate(${box.left} ${box.top})`}
                  d={hatchPath(box.width, box.height, style.pitch, style.crossed)}
                  fill="none"
                  stroke={colour(style.colour)}
                  strokeWidth={style.stroke}
                />
              </g>
            )}
          </g>
        );
      })}
      <path
        d={planePath(
          boundary.map((line) => line.map(inShares)),
          box,
        )}
        fill="none"
        stroke={colour("stop")}
        strokeWidth={2}
      />
      <PlaneAxes size={size} names={names} ticks={{ x: spanX.ticks(size.ticks), y: spanY.ticks(size.ticks) }} />
      {at ? <PlaneMark x={box.atX(at.x)} y={box.atY(at.y)} /> : null}
    </svg>
  );
}

function spanOf(values: readonly number[]) {
  const [from, to] = [values.at(0) ?? 0, values.at(-1) ?? 1];
  const shareOf = (value: number) => (value - from) / (to - from);
  return {
    shareOf,
    ticks: (count: number) =>
      multiples(niceStep((to - from) / count), from, to).map((value) => ({
        at: shareOf(value),
        text: signedTick(value),
      })),
  };
}
