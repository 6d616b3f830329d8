import { colour } from "./colour.ts";
import { Hatch, type HatchProps } from "./Hatch.tsx";
import { HATCH_STYLES } from "./severity.ts";

export interface HatchBoxProps extends HatchProps {
  outline?: number;
}

/** A raised box with its hatch and outline, for use inside a drawing. The outline lies inside the given bounds. */
export function HatchBox({ level, x, y, width, height, scale = 1, outline = 1 }: HatchBoxProps) {
  const style = HATCH_STYLES[level];
  const box = {
    x: x + outline / 2,
    y: y + outline / 2,
    width: Math.max(0, width - outline),
    height: Math.max(0, height - outline),
  };
  return (
    <>
      <rect {...box} fill={colour("raised")} />
      <Hatch
        level={level}
        x={x + outline}
        y={y + outline}
        width={width - 2 * outline}
        height={height - 2 * outline}
        scale={scale}
      />
      <rect
        {...box}
        fill="none"
        stroke={colour(style.colour)}
        strokeWidth={outline}
        strokeDasharray={style.dashedOutline ? "3 2" : undefined}
      />
    </>
  );
}
