import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { planeBox, type PlaneSize } from "./plane.ts";

/** A tick at a share of its axis. */
export interface PlaneTick {
  at: number;
  text: string;
}

interface Props {
  size: PlaneSize;
  ticks: { x: readonly PlaneTick[]; y: readonly PlaneTick[] };
  /** names of the axes with their units */
  names: { x: string; y: string };
}

/** Frame, ticks and names of a drawing over two quantities. */
export function PlaneAxes({ size, ticks, names }: Props) {
  const box = planeBox(size);
  const text = { fontSize: size.text, fill: colour("quiet") };
  return (
    <g>
      <rect x={box.left} y={box.top} width={box.width} height={box.height} fill="none" stroke={colour("ink")} />
      {ticks.x.map(({ at, text: label }) => (
        <g key={at}>
          <path d={`M${coordinate(box.atX(at))} ${box.bottom}v4`} stroke={colour("ink")} />
          <text style={text} x={coordinate(box.atX(at))} y={box.bottom + 18} textAnchor="middle">
            {label}
          </text>
        </g>
      ))}
      {ticks.y.map(({ at, text: label }) => (
        <g key={at}>
          <path d={`M${box.left} ${coordinate(box.atY(at))}h-4`} stroke={colour("ink")} />
          <text style={text} x={box.left - 8} y={coordinate(box.atY(at) + 4)} textAnchor="end">
            {label}
          </text>
        </g>
      ))}
      {size.named ? (
        <>
          <text style={text} x={box.left + box.width / 2} y={size.height - 6} textAnchor="middle">
            {names.x}
          </text>
          <text style={text} transform={`translate(14 ${box.top + box.height / 2}) rotate(-90)`} textAnchor="middle">
            {names.y}
          </text>
        </>
      ) : null}
    </g>
  );
}
