import { colour } from "./colour.ts";

/** Clear modules around a code, without which it is not found. */
const QUIET_MODULES = 4;

/** A square code as vector, with its quiet zone. Its address stands beside it in words or on the page. */
export function CodeDrawing({ size, path, label }: { size: number; path: string; label: string }) {
  const whole = size + 2 * QUIET_MODULES;
  return (
    <svg viewBox={`${-QUIET_MODULES} ${-QUIET_MODULES} ${whole} ${whole}`} role="img" aria-label={label}>
      <path d={path} fill={colour("ink")} shapeRendering="crispEdges" />
    </svg>
  );
}
