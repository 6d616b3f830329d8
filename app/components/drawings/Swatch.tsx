import { HatchBox } from "./HatchBox.tsx";
import type { HatchLevel } from "./severity.ts";

export interface SwatchProps {
  level: HatchLevel;
  width?: number;
  height?: number;
  /** Pitch against the bar's: 0.8 in running text, 1.3 × 0.8 on the floor. */
  scale?: number;
}

/** A small sample of a hatch, 22 × 14 px. Always beside its word, so it is hidden from assistive technology. */
export function Swatch({ level, width = 22, height = 14, scale = 0.8 }: SwatchProps) {
  return (
    <svg className="inline-block flex-none align-[-2px]" width={width} height={height} aria-hidden="true">
      <HatchBox level={level} x={0} y={0} width={width} height={height} scale={scale} />
    </svg>
  );
}
