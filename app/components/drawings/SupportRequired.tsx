import type { Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import { colour } from "./colour.ts";
import { HatchBox } from "./HatchBox.tsx";
import { runsOf } from "./runs-of.ts";
import { OUTCOME_SIGNS, SUPPORT_SIGNS, type HatchLevel } from "./severity.ts";
import { textWidth } from "./text-width.ts";

export interface SupportRequiredProps {
  /** One entry per step. */
  required: readonly SupportClass[];
  /** One entry per step: steps that must not run, or cannot be judged, get a plate in their own column. */
  outcomes?: readonly Outcome[];
  x: number;
  y: number;
  columnWidth: number;
  height: number;
  /** Size of the words, px. */
  textSize?: number;
  scale?: number;
  /** Words stand below the bar instead of on it. */
  withoutWords?: boolean;
}

/** How a word may be broken or shortened when its segment is narrow, widest first. */
const SHORTER_WORDS: Readonly<Record<string, readonly (readonly string[])[]>> = {
  "Thin-wafer gripper": [["Thin-wafer gripper"], ["Thin-wafer", "gripper"], ["Gripper"]],
  "Tape or ring": [["Tape or ring"], ["Tape or", "ring"]],
  "None fits": [["None fits"], ["None", "fits"]],
  "Cannot judge": [["Cannot judge"], ["Cannot", "judge"]],
  "Do not run": [["Do not run"], ["Do not", "run"]],
};

/** The support that each step needs, as hatched segments with their word on a plate, for use inside a drawing. */
export function SupportRequired(props: SupportRequiredProps) {
  const { required, outcomes = [], x, y, columnWidth, height, textSize = 12.5, scale = 1 } = props;
  const withWords = props.withoutWords !== true;
  const at = (index: number) => x + index * columnWidth;
  const blocked = outcomes.flatMap((outcome, index) =>
    outcome === "do not run" || outcome === "cannot judge" ? [{ outcome, index }] : [],
  );
  return (
    <g>
      {runsOf(required).map((run) => {
        const sign = SUPPORT_SIGNS[run.value];
        const segment = { x: at(run.from), y, width: (run.to - run.from) * columnWidth, height };
        // The word stands at the segment's start, or after the first blocked column that would cover it.
        const free = firstFreeStretch(run, new Set(blocked.map(({ index }) => index)));
        return (
          <g key={run.from}>
            <HatchBox level={sign.level} {...segment} scale={scale} />
            {withWords && free ? (
              <Plate
                word={sign.word}
                level={sign.level}
                size={textSize}
                box={{ x: at(free.from), y, width: (free.to - free.from) * columnWidth, height }}
              />
            ) : null}
          </g>
        );
      })}
      {blocked.map(({ outcome, index }) => {
        const sign = OUTCOME_SIGNS[outcome];
        const box = { x: at(index), y, width: columnWidth, height };
        return (
          <g key={index}>
            <HatchBox level={sign.level} {...box} scale={scale} />
            {withWords ? <Plate word={sign.word} level={sign.level} size={textSize} box={box} centred /> : null}
          </g>
        );
      })}
    </g>
  );
}

function firstFreeStretch(run: { from: number; to: number }, taken: ReadonlySet<number>) {
  let from = run.from;
  while (from < run.to && taken.has(from)) from += 1;
  let to = from;
  while (to < run.to && !taken.has(to)) to += 1;
  return to > from ? { from, to } : null;
}

function Plate(props: {
  word: string;
  level: HatchLevel;
  size: number;
  box: { x: number; y: number; width: number; height: number };
  centred?: boolean;
}) {
  const { word, level, size, box, centred = false } = props;
  const widthOf = (lines: readonly string[]) => Math.max(...lines.map((line) => textWidth(line, size, true)));
  const choices = SHORTER_WORDS[word] ?? [[word]];
  const lines = choices.find((each) => widthOf(each) + 8 <= box.width) ?? choices.at(-1) ?? [word];
  const inset = centred || lines.length > 1 || box.width < widthOf(lines) + 20 ? null : 7;
  const width = Math.min(widthOf(lines) + (inset === null ? 6 : 14), box.width - 2);
  const lineHeight = size * 1.1;
  const height = lines.length === 1 ? size + 5.5 : Math.min(box.height - 3, lines.length * lineHeight + 1.5);
  const left = inset === null ? box.x + (box.width - width) / 2 : box.x + inset;
  const top = box.y + (box.height - height) / 2;
  const first = box.y + box.height / 2 + size * 0.36 - ((lines.length - 1) * lineHeight) / 2;
  return (
    <>
      {level === "clear" ? null : <rect x={left} y={top} width={width} height={height} fill={colour("raised")} />}
      {lines.map((line, index) => (
        <text
          key={line}
          x={left + width / 2}
          y={first + index * lineHeight}
          textAnchor="middle"
          style={{ fontSize: size, fontWeight: 600, fill: level === "stop" ? colour("stop") : undefined }}
        >
          {line}
        </text>
      ))}
    </>
  );
}
