import { useId } from "react";
import { colour } from "#app/components/drawings/colour.ts";
import { planePath, type PlaneBox } from "#app/components/drawings/plane.ts";
import { PlaneWords } from "#app/components/drawings/PlaneWords.tsx";
import { textWidth } from "#app/components/drawings/text-width.ts";
import type { SweepAnswer } from "#app/lib/stack-sweep/answers.ts";
import { placeState } from "#app/lib/stack-sweep/place-words.ts";
import type { DrawnMap } from "#app/schemas/stack-sweep.ts";
import { levelLabels } from "./level-labels.ts";
import { ownWords, type Mark } from "./own-words.ts";
import { deepestPlace } from "./region-label.ts";

interface Props {
  map: DrawnMap;
  answer: SweepAnswer;
  box: PlaneBox;
  textSize: number;
  mark: Mark | null;
}

/** The lines of the answer, the limit heavy, with their values; and the words of what is curled. */
export function MapLevels({ map, answer, box, textSize, mark }: Props) {
  const id = useId();
  const { levels, cells, states, without } = map;
  const curled = deepestPlace(cells, (n) => states.charAt(n) === "1");
  const none = deepestPlace(cells, (n) => states.charAt(n) === "2");
  const words = [
    ...(curled ? [{ x: box.atX(curled.x), y: box.atY(curled.y), text: "curled" }] : []),
    ...(none ? [{ x: box.atX(none.x), y: box.atY(none.y), text: answer.none }] : []),
  ].map((each) => withinFrame(each, box, textSize));
  const taken = [
    ...words.map(({ x, y, text }) => around(x, y, textWidth(text, textSize) + 6, textSize * 1.3)),
    ...(mark ? [around(mark.x, mark.y, 20, 20), around(ownWords(mark, box, textSize / 0.9).x, mark.y, 100, 20)] : []),
  ];
  const labels = levelLabels(
    levels.map(({ lines, value, limit }) => ({
      lines: lines.flatMap((line) => shownRuns(line, map)),
      text: answer.words(value),
      limit: limit !== null,
    })),
    box,
    textSize,
    taken,
  );
  return (
    <>
      <clipPath id={id}>
        <path
          d={`M${box.left} ${box.top}H${box.right}V${box.bottom}H${box.left}Z${planePath(without, box)}`}
          clipRule="evenodd"
        />
      </clipPath>
      <g clipPath={`url(#${id})`}>
        {levels.map(({ value, limit, lines }) => (
          <path
            key={`${value} ${limit ?? ""}`}
            d={planePath(lines, box)}
            fill="none"
            stroke={colour(limit === null ? "silicon" : "stop")}
            strokeWidth={limit === null ? 1.1 : 2.6}
            strokeLinejoin="round"
          />
        ))}
      </g>
      {labels.map(({ x, y, text, limit }) => (
        <PlaneWords key={`${text} ${x}`} x={x} y={y} text={text} textSize={textSize} plate bold={limit} limit={limit} />
      ))}
      {words.map(({ x, y, text }) => (
        <PlaneWords key={text} x={x} y={y} text={text} textSize={textSize} plate />
      ))}
    </>
  );
}

/** The runs of a line where the answer means something: the rest is not drawn, and has no label. */
function shownRuns(line: DrawnMap["levels"][number]["lines"][number], { cells, states }: DrawnMap) {
  const runs: (typeof line)[] = [[]];
  for (const point of line) {
    const nearest = Math.round(point.y * cells) * (cells + 1) + Math.round(point.x * cells);
    if (placeState(states, nearest) === "2") runs.push([]);
    else runs.at(-1)?.push(point);
  }
  return runs.filter(({ length }) => length > 1);
}

const around = (x: number, y: number, width: number, height: number) => ({
  x: x - width / 2,
  y: y - height / 2,
  width,
  height,
});

function withinFrame<At extends Mark>(at: At, box: PlaneBox, textSize: number): At {
  const half = textWidth(at.text, textSize) / 2 + 6;
  return { ...at, x: Math.min(box.right - half, Math.max(box.left + half, at.x)) };
}
