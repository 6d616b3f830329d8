import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { textWidth } from "./text-width.ts";

interface Props {
  x: number;
  y: number;
  text: string;
  textSize: number;
  plate?: boolean;
  bold?: boolean;
  limit?: boolean;
}

/** Words about a middle, on a plate of the ground or with a rim of it. */
export function PlaneWords({ x, y, text, textSize, plate = false, bold = false, limit = false }: Props) {
  const width = textWidth(text, textSize, bold) + 6;
  return (
    <g pointerEvents="none">
      {plate ? (
        <rect
          x={coordinate(x - width / 2)}
          y={coordinate(y - textSize * 0.62)}
          width={coordinate(width)}
          height={coordinate(textSize * 1.24)}
          fill={colour("raised")}
        />
      ) : null}
      <text
        x={coordinate(x)}
        y={coordinate(y + textSize * 0.36)}
        textAnchor="middle"
        style={{
          fontSize: textSize,
          fontWeight: bold ? 600 : 400,
          fill: colour(limit ? "stop" : "ink"),
          ...(!plate && { paintOrder: "stroke", stroke: colour("raised"), strokeWidth: 4, strokeLinejoin: "round" }),
        }}
      >
        {text}
      </text>
    </g>
  );
}
