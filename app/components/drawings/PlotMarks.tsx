import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import type { Plot, PlotFrame, PlotScales } from "./plot.ts";

interface Props {
  plot: Plot;
  frame: PlotFrame;
  scales: PlotScales;
  textSize: number;
}

/** What a plot points out on its curves: filled dots, short upright bars where a curve begins to curl, and numbered rings. */
export function PlotMarks({ plot, frame, scales, textSize }: Props) {
  return plot.marks?.map(({ kind, x, y, colourToken, text }) => {
    const [left, top] = [scales.x(x), scales.y(y)];
    if (left < frame.left - 0.5 || left > frame.right + 0.5 || top < frame.top - 0.5 || top > frame.bottom + 0.5)
      return null;
    const key = `${kind} ${colourToken} ${text ?? ""} ${x}`;
    const [cx, cy] = [coordinate(left), coordinate(top)];
    if (kind === "own") return <circle key={key} cx={cx} cy={cy} r="5" fill={colour(colourToken)} />;
    if (kind === "onset")
      return <path key={key} d={`M${cx} ${coordinate(top - 9)}v18`} stroke={colour(colourToken)} strokeWidth="2.5" />;
    return (
      <g key={key}>
        <circle cx={cx} cy={cy} r="6" fill="none" stroke={colour("ink")} strokeWidth="1.5" />
        <text
          x={coordinate(left + 8)}
          y={coordinate(top - 7)}
          style={{
            fontSize: textSize,
            fontWeight: 600,
            paintOrder: "stroke",
            stroke: colour("raised"),
            strokeWidth: 3,
            strokeLinejoin: "round",
          }}
        >
          {text}
        </text>
      </g>
    );
  });
}
