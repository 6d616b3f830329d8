import { colour } from "./colour.ts";
import { hatchPath } from "./hatch-path.ts";
import { HATCH_STYLES, type HatchLevel } from "./severity.ts";

export interface HatchProps {
  level: HatchLevel;
  x: number;
  y: number;
  width: number;
  height: number;
  /** Scales pitch and stroke: 0.8 in a swatch, 1.3 on the floor. */
  scale?: number;
}

/**
 * The ruled filling of a box, for use inside a drawing. Lines in a nested, clipping svg and never a pattern: browsers
 * rasterise patterns when printing, and at 300 dpi the hatch came out as blocks.
 */
export function Hatch({ level, x, y, width, height, scale = 1 }: HatchProps) {
  const style = HATCH_STYLES[level];
  if (style.pitch === null || width <= 0 || height <= 0) return null;
  return (
    <svg x={x} y={y} width={width} height={height} overflow="hidden" aria-hidden="true">
      <path
        d={hatchPath(width, height, style.pitch * scale, style.crossed)}
        fill="none"
        stroke={colour(style.colour)}
        strokeWidth={style.stroke * scale}
      />
    </svg>
  );
}
