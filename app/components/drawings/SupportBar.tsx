import type { Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import { colour } from "./colour.ts";
import { lineBarLayout, numberAt, PLANNED_TITLE } from "./line-bar-layout.ts";
import { runsOf } from "./runs-of.ts";
import { SUPPORT_SIGNS } from "./severity.ts";
import { stackRows } from "./stack-rows.ts";
import { SupportPlanned } from "./SupportPlanned.tsx";
import { SupportRequired } from "./SupportRequired.tsx";
import { textWidth } from "./text-width.ts";

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

function LineBar(props: SupportBarProps) {
  const { required, planned, outcomes, label, variant } = props;
  const { sizes, columnWidth, height, numbered, narrowWords, lineHeight, hasRoomForTitle } = lineBarLayout(props);
  const { width, gutter, text, numberY, headY, bar, plannedY, line, thin, extension } = sizes;
  const narrowY = height - narrowWords.length * lineHeight;
  return (
    <svg className="block h-auto w-full" viewBox={`0 0 ${width} ${height}`} role="img" aria-label={label}>
      {required.map((_, index) => (
        <g key={index}>
          {index === 0 ? null : (
            <path d={`M${gutter + index * columnWidth} 0V${headY}`} stroke={colour("ink")} strokeWidth={line} />
          )}
          {index === 0 || numberAt(props, index) % numbered === 0 ? (
            <text
              x={gutter + (index + 0.5) * columnWidth}
              y={numberY}
              textAnchor="middle"
              style={{ fontSize: text, fontWeight: 600 }}
            >
              {numberAt(props, index)}
            </text>
          ) : null}
        </g>
      ))}
      <path d={`M0 ${headY}H${width}`} stroke={colour("ink")} strokeWidth={line} />
      <SupportRequired
        required={required}
        outcomes={outcomes}
        x={gutter}
        columnWidth={columnWidth}
        textSize={text}
        wordsElsewhere={variant === "paper" ? "narrow" : undefined}
        {...bar}
      />
      {hasRoomForTitle ? (
        <text x={gutter + 4} y={plannedY + text * 0.36} style={{ fontSize: text }}>
          {PLANNED_TITLE}
        </text>
      ) : null}
      <SupportPlanned
        planned={planned}
        x={gutter}
        y={plannedY}
        columnWidth={columnWidth}
        textSize={text}
        lineWidth={thin}
        extension={extension}
      />
      {narrowWords.map((words, row) => (
        <text key={row} x={gutter + 4} y={narrowY + row * lineHeight + text * 0.75} style={{ fontSize: text }}>
          {words}
        </text>
      ))}
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
      <SupportRequired
        required={required}
        outcomes={outcomes}
        x={0}
        columnWidth={columnWidth}
        wordsElsewhere="all"
        {...bar}
      />
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
              {numberAt(props, index)}
            </text>
          </g>
        );
      })}
    </svg>
  );
}
