import type { Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import { colour } from "./colour.ts";
import { HatchBox } from "./HatchBox.tsx";
import type { HatchLevel } from "./severity.ts";
import { linesWidth, supportSegments, wordLines } from "./support-segments.ts";

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
  /** Which words the caller writes elsewhere: all of them, or those that have no room on their segment. */
  wordsElsewhere?: "all" | "narrow";
}

/** The support that each step needs, as hatched segments with their word on a plate, for use inside a drawing. */
export function SupportRequired(props: SupportRequiredProps) {
  const { required, outcomes = [], x, y, columnWidth, height, textSize = 12.5, scale = 1, wordsElsewhere } = props;
  const box = ({ from, to }: { from: number; to: number }) => ({
    x: x + from * columnWidth,
    y,
    width: (to - from) * columnWidth,
    height,
  });
  return (
    <g>
      {supportSegments(required, outcomes).map((segment) => (
        <g key={`${segment.blocked} ${segment.from}`}>
          <HatchBox level={segment.level} {...box(segment)} scale={scale} />
          {segment.wordAt && wordsElsewhere !== "all" ? (
            <Plate
              word={segment.word}
              level={segment.level}
              size={textSize}
              box={box(segment.wordAt)}
              centred={segment.blocked}
              onlyIfFits={wordsElsewhere === "narrow"}
            />
          ) : null}
        </g>
      ))}
    </g>
  );
}

function Plate(props: {
  word: string;
  level: HatchLevel;
  size: number;
  box: { x: number; y: number; width: number; height: number };
  centred: boolean;
  onlyIfFits: boolean;
}) {
  const { word, level, size, box, centred, onlyIfFits } = props;
  const { lines, fits } = wordLines(word, box.width, size);
  if (onlyIfFits && !fits) return null;
  const inset = centred || lines.length > 1 || box.width < linesWidth(lines, size) + 20 ? null : 7;
  const width = Math.min(linesWidth(lines, size) + (inset === null ? 6 : 14), box.width - 2);
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
