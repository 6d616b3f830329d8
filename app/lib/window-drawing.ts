import { contours } from "#app/engine/window/contours.ts";
import type { ProcessWindow } from "#app/engine/window/window.ts";
import { blocks } from "#app/engine/trial/margin.ts";
import type { WindowDrawing, WindowRun } from "#app/schemas/process-window.ts";
import type { WindowChoice } from "./window-inputs.ts";

/** Every how many places the table has a row and a column. */
const TABLE_STEP = 8;

/** A process window in the units of its axes, ready to be drawn and read. */
export function windowDrawing(
  { x, y, points, walks }: ProcessWindow,
  choices: { x: WindowChoice; y: WindowChoice },
): WindowDrawing {
  const [ownX, ownY] = [x.map(choices.x.toUnit), y.map(choices.y.toUnit)];
  const side = x.length;
  const runs: WindowRun[] = [];
  for (const [index, { outcome }] of points.entries()) {
    const [row, column] = [Math.floor(index / side), index % side];
    const last = runs.at(-1);
    if (last && last.row === row && last.outcome === outcome) last.to = column;
    else runs.push({ outcome, row, from: column, to: column });
  }
  const every = (values: readonly number[]) => values.flatMap((_, index) => (index % TABLE_STEP === 0 ? [index] : []));
  const [columns, rows] = [every(x), every(y)];
  return {
    x: ownX,
    y: ownY,
    runs,
    boundary: contours(
      ownX,
      ownY,
      points.map(({ outcome }) => (blocks(outcome) ? 1 : 0)),
      0.5,
    ),
    planned: within(ownX, choices.x) && within(ownY, choices.y) ? plannedAt(choices) : null,
    tableX: columns.map((column) => ownX[column] ?? 0),
    table: rows.toReversed().map((row) => ({
      y: ownY[row] ?? 0,
      cells: columns.map((column) => {
        const point = points[row * side + column];
        return { outcome: point?.outcome ?? "cannot judge", margin: point?.margin ?? null };
      }),
    })),
    walks,
  };
}

function within(values: readonly number[], { value, toUnit }: WindowChoice): boolean {
  const at = toUnit(value);
  return at >= Math.min(...values) && at <= Math.max(...values);
}

const plannedAt = ({ x, y }: { x: WindowChoice; y: WindowChoice }) => ({ x: x.toUnit(x.value), y: y.toUnit(y.value) });
