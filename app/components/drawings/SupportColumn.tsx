import { colour } from "./colour.ts";
import { Hatch } from "./Hatch.tsx";
import { HATCH_STYLES, type HatchLevel } from "./severity.ts";

export interface SupportColumnProps {
  level: HatchLevel;
  width?: number;
  scale?: number;
  /** Tallest row that the hatch is drawn for, px; what is longer than its row is cut off by the svg. */
  tallest?: number;
}

/**
 * The support bar turned upright, at the left of a step's row on a phone and of the command on the floor. It fills the
 * height of its parent, which is positioned; its word stands in the row.
 */
export function SupportColumn({ level, width = 20, scale = 1, tallest = 480 }: SupportColumnProps) {
  return (
    <svg className="absolute inset-y-0 left-0 h-full" width={width} overflow="hidden" aria-hidden="true">
      <rect width={width} height="100%" fill={colour("raised")} />
      <Hatch level={level} x={0} y={0} width={width} height={tallest} scale={scale} />
      <path
        d={`M0.5 0V${tallest}M${width - 0.5} 0V${tallest}`}
        stroke={colour(HATCH_STYLES[level].colour)}
        strokeDasharray={HATCH_STYLES[level].dashedOutline ? "3 2" : undefined}
      />
    </svg>
  );
}
