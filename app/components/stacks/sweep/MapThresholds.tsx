import { colour } from "#app/components/drawings/colour.ts";
import { coordinate } from "#app/components/drawings/coordinate.ts";
import type { PlaneBox } from "#app/components/drawings/plane.ts";
import { shareAt } from "#app/lib/stack-sweep/axis.ts";
import type { DrawnAxis } from "#app/schemas/stack-sweep.ts";

interface Props {
  axis: DrawnAxis;
  along: "x" | "y";
  box: PlaneBox;
  textSize: number;
}

/** The site's thresholds of silicon as dotted lines across, named at the end. */
export function MapThresholds({ axis, along, box, textSize }: Props) {
  return axis.thresholds.map(({ value, label }) => {
    const share = shareAt(axis, value);
    const at = coordinate(along === "x" ? box.atX(share) : box.atY(share));
    const style = {
      fontSize: textSize,
      fill: colour("quiet"),
      paintOrder: "stroke" as const,
      stroke: colour("raised"),
      strokeWidth: 3,
    };
    return (
      <g key={label}>
        <path
          d={along === "x" ? `M${at} ${box.top}V${box.bottom}` : `M${box.left} ${at}H${box.right}`}
          stroke={colour("ink")}
          strokeDasharray="2 3"
        />
        {along === "x" ? (
          <text transform={`translate(${Number(at) - 4} ${box.bottom - 5}) rotate(-90)`} style={style}>
            {label}
          </text>
        ) : (
          <text x={box.left + 5} y={Number(at) - 4} style={style}>
            {label}
          </text>
        )}
      </g>
    );
  });
}
