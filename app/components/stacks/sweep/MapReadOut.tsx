import type { KeyboardEvent } from "react";
import { valueAt } from "#app/lib/stack-sweep/axis.ts";
import type { DrawnAxis, DrawnMap } from "#app/schemas/stack-sweep.ts";
import { axisText } from "./sweep-plot.ts";

interface Place {
  column: number;
  row: number;
}

interface Props {
  map: DrawnMap;
  at: Place;
  /** the answer there */
  words: string;
  onRead: (place: Place) => void;
}

const MOVES: Partial<Record<string, Place>> = {
  ArrowLeft: { column: -1, row: 0 },
  ArrowRight: { column: 1, row: 0 },
  ArrowUp: { column: 0, row: 1 },
  ArrowDown: { column: 0, row: -1 },
};

/**
 * Reads a map at one place, in words: a native range for each axis, whose spoken text is the whole of it. In either of them the arrow
 * keys move as they point.
 */
export function MapReadOut({ map: { x, y, cells }, at, words, onRead }: Props) {
  const [alongX, alongY] = [textAt(x, at.column / cells), textAt(y, at.row / cells)];
  const spoken = `${x.label} ${alongX}; ${y.label} ${alongY}: ${words}`;
  const within = (n: number) => Math.min(cells, Math.max(0, n));
  const move = (event: KeyboardEvent) => {
    const by = MOVES[event.key];
    if (!by || event.ctrlKey || event.altKey || event.metaKey) return;
    event.preventDefault();
    onRead({ column: within(at.column + by.column), row: within(at.row + by.row) });
  };
  const range = (axis: DrawnAxis, value: number, onValue: (value: number) => void) => (
    <label className="block min-w-0 flex-1 basis-56 text-label">
      <span className="text-quiet">{axis.label}</span>
      <input
        type="range"
        className="plot-cursor block w-full"
        min={0}
        max={cells}
        step={1}
        value={value}
        aria-label={`Read along ${axis.label}`}
        aria-valuetext={spoken}
        onKeyDown={move}
        onChange={(event) => onValue(event.currentTarget.valueAsNumber)}
      />
    </label>
  );
  return (
    <div className="mt-2 max-w-220">
      <div className="flex flex-wrap gap-x-6">
        {range(x, at.column, (column) => onRead({ ...at, column }))}
        {range(y, at.row, (row) => onRead({ ...at, row }))}
      </div>
      <p className="min-h-10 text-label" aria-hidden="true">
        <b>{words}</b> at {x.label} {alongX}; {y.label} {alongY}
      </p>
    </div>
  );
}

const textAt = (axis: DrawnAxis, share: number) => axisText(axis, valueAt(axis, share));
