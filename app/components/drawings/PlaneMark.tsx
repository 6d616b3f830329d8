import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";

/** What is as planned, in a drawing over two quantities: a ring with a point. */
export function PlaneMark({ x, y }: { x: number; y: number }) {
  const [cx, cy] = [coordinate(x), coordinate(y)];
  return (
    <g>
      <circle cx={cx} cy={cy} r={7} fill={colour("raised")} stroke={colour("ink")} strokeWidth={2} />
      <circle cx={cx} cy={cy} r={2} fill={colour("ink")} />
    </g>
  );
}
