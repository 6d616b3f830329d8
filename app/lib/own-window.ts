import type { WindowDrawing } from "#app/schemas/process-window.ts";
import { ownValue, type OwnUnits } from "./own-units.ts";

/** What is drawn of a process window in the units of whoever reads it; its table is rewritten where it is written. */
export function ownWindow(drawing: WindowDrawing, symbols: { x: string; y: string }, units: OwnUnits): WindowDrawing {
  const x = (value: number) => ownValue(value, symbols.x, units);
  const y = (value: number) => ownValue(value, symbols.y, units);
  const place = (point: { x: number; y: number }) => ({ x: x(point.x), y: y(point.y) });
  return {
    ...drawing,
    x: drawing.x.map(x),
    y: drawing.y.map(y),
    boundary: drawing.boundary.map((points) => points.map(place)),
    planned: drawing.planned && place(drawing.planned),
  };
}
