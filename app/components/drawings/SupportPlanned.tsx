import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { PLANNED_ROW_PITCH, plannedSpans } from "./planned-spans.ts";
import { textWidth } from "./text-width.ts";

export interface SupportPlannedProps {
  /** One entry per step: what is planned to hold the wafer, in words; null where it is bare. */
  planned: readonly (string | null)[];
  x: number;
  /** Height of the line. */
  y: number;
  columnWidth: number;
  textSize?: number;
  lineWidth?: number;
  /** Extension lines reach this far above and below the line, px. */
  extension?: readonly [above: number, below: number];
}

/**
 * Planned support as dimension lines, for use inside a drawing: a hatch with no line under it is a missing carrier.
 * Words stand in the gap of their line, or beneath it where that is too short.
 */
export function SupportPlanned(props: SupportPlannedProps) {
  const { planned, x, y, columnWidth, textSize = 12.5, lineWidth = 0.75, extension = [15, 9] } = props;
  return (
    <g>
      {plannedSpans(planned, columnWidth, textSize).map((span) => {
        const left = x + span.from * columnWidth + 1;
        const right = x + span.to * columnWidth - 1;
        const middle = (left + right) / 2;
        const inLine = span.row === null;
        const gap = textWidth(span.text, textSize) / 2 + 7;
        const line = inLine
          ? `M${coordinate(left)} ${y}H${coordinate(middle - gap)}M${coordinate(middle + gap)} ${y}H${coordinate(right)}`
          : `M${coordinate(left)} ${y}H${coordinate(right)}`;
        const ends = [left, right].map((at) => `M${coordinate(at)} ${y - extension[0]}V${y + extension[1]}`).join("");
        const baseline = y + textSize * 0.36 + ((span.row ?? -1) + 1) * textSize * PLANNED_ROW_PITCH;
        return (
          <g key={span.from}>
            <path d={ends + line} fill="none" stroke={colour("ink")} strokeWidth={lineWidth} />
            <path
              d={`M${coordinate(left)} ${y}l9 -2.6v5.2zM${coordinate(right)} ${y}l-9 -2.6v5.2z`}
              fill={colour("ink")}
            />
            <text
              x={coordinate(inLine ? middle : left + 4)}
              y={coordinate(baseline)}
              textAnchor={inLine ? "middle" : "start"}
              style={{ fontSize: textSize }}
            >
              {span.text}
            </text>
          </g>
        );
      })}
    </g>
  );
}
