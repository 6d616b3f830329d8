import type { Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import { colour } from "./colour.ts";
import { plannedRowsHeight } from "./planned-spans.ts";
import { runsOf } from "./runs-of.ts";
import { SUPPORT_SIGNS } from "./severity.ts";
import { stackRows } from "./stack-rows.ts";
import { textWidth } from "./text-width.ts";
import { SupportPlanned } from "./SupportPlanned.tsx";
import { SupportRequired } from "./SupportRequired.tsx";

export interface SupportBarProps {
  /** One entry per step, in order. */
  required: readonly SupportClass[];
  planned: readonly (string | null)[];
  outcomes?: readonly Outcome[];
  /** Step numbers; 1, 2, 3 … by default. */
  numbers?: readonly number[];
  /** The bar in words, such as 'carrier from step 12 to 17'. */
  label: string;
  /** paper: smaller words, finer lines, for the head of a sheet. floor: large numbers, words below, current step marked. */
  variant?: "screen" | "paper" | "floor";
  /** Index of the step the reader is at. */
  current?: number;
}

/** Support over all steps of a flow: what each needs (hatch and word) and, as dimension lines, what is planned. */
export function SupportBar(props: SupportBarProps) {
  return props.variant === "floor" ? <FloorBar {...props} /> : <LineBar {...props} />;
}

function numberOf(props: SupportBarProps, index: number): number {
  return props.numbers?.[index] ?? index + 1;
}

function LineBar(props: SupportBarProps) {
  const { required, planned, outcomes, label, variant } = props;
  const paper = variant === "paper";
  const width = paper ? 680 : 1200;
  const gutter = paper ? 0 : 1;
  const columnWidth = (width - 2 * gutter) / required.length;
  const textSize = paper ? 10 : 12.5;
  const bar = paper ? { y: 25, height: 28 } : { y: 32, height: 32 };
  const lineY = paper ? 69 : 82;
  const below = plannedRowsHeight(planned, columnWidth, textSize);
  const headY = paper ? 19 : 24;
  const noneBefore = planned.findIndex((each) => each !== null);
  const hasRoomForTitle = noneBefore < 0 || noneBefore * columnWidth > (paper ? 86 : 110);
  return (
    <svg
      className="block h-auto w-full"
      viewBox={`0 0 ${width} ${lineY + (paper ? 13 : 16) + below}`}
      role="img"
      aria-label={label}
    >
      {required.map((_, index) => (
        <g key={index}>
          {index === 0 ? null : (
            <path
              d={`M${gutter + index * columnWidth} 0V${headY}`}
              stroke={colour("ink")}
              strokeWidth={paper ? 0.6 : 1}
            />
          )}
          <text
            x={gutter + (index + 0.5) * columnWidth}
            y={paper ? 14 : 17}
            textAnchor="middle"
            style={{ fontSize: paper ? 11 : 12.5, fontWeight: 600 }}
          >
            {numberOf(props, index)}
          </text>
        </g>
      ))}
      <path d={`M0 ${headY}H${width}`} stroke={colour("ink")} strokeWidth={paper ? 0.6 : 1} />
      <SupportRequired
        required={required}
        outcomes={outcomes}
        x={gutter}
        columnWidth={columnWidth}
        textSize={paper ? 13 : 12.5}
        {...bar}
      />
      {hasRoomForTitle ? (
        <text x={gutter + 4} y={lineY + textSize * 0.36} style={{ fontSize: textSize }}>
          Planned support
        </text>
      ) : null}
      <SupportPlanned
        planned={planned}
        x={gutter}
        y={lineY}
        columnWidth={columnWidth}
        textSize={textSize}
        lineWidth={paper ? 0.6 : 0.75}
        extension={paper ? [12, 7] : [15, 9]}
      />
    </svg>
  );
}

function FloorBar(props: SupportBarProps) {
  const { required, outcomes, label, current } = props;
  const width = 808;
  const columnWidth = width / required.length;
  const bar = { y: 44, height: 29 };
  const words = runsOf(required).map((run) => ({
    at: run.from * columnWidth + 2,
    word: SUPPORT_SIGNS[run.value].word,
  }));
  const rows = stackRows(
    words.map(({ at }) => at),
    words.map(({ word }) => textWidth(word, 14, true)),
  );
  return (
    <svg
      className="block h-auto w-full"
      viewBox={`0 0 ${width} ${104 + Math.max(...rows) * 18}`}
      role="img"
      aria-label={label}
    >
      <SupportRequired required={required} outcomes={outcomes} x={0} columnWidth={columnWidth} withoutWords {...bar} />
      {words.map(({ at, word }, index) => (
        <text
          key={at}
          x={at}
          y={bar.y + bar.height + 20 + (rows[index] ?? 0) * 18}
          style={{ fontSize: 14, fontWeight: 600 }}
        >
          {word}
        </text>
      ))}
      {required.map((_, index) => {
        const left = index * columnWidth;
        const here = index === current;
        return (
          <g key={index}>
            {here ? (
              <>
                <rect x={left + 2} y="12" width={columnWidth - 4} height="26" fill={colour("ink")} />
                <path d={`M${left + columnWidth / 2} ${bar.y}l-6 -6h12z`} fill={colour("ink")} />
                <rect
                  x={left + 1}
                  y={bar.y - 1}
                  width={columnWidth - 2}
                  height={bar.height + 2}
                  fill="none"
                  stroke={colour("ink")}
                  strokeWidth="3"
                />
              </>
            ) : null}
            <text
              x={left + columnWidth / 2}
              y="30"
              textAnchor="middle"
              style={{
                fontSize: 14,
                fontWeight: here ? 600 : 400,
                fill: here ? colour("surface") : index < (current ?? 0) ? colour("quiet") : undefined,
              }}
            >
              {numberOf(props, index)}
            </text>
          </g>
        );
      })}
    </svg>
  );
}
