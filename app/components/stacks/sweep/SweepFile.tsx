import type { SweptView } from "#app/schemas/stack-sweep.ts";
import { sweepName } from "./sweep-name.ts";
import { SweepPrint } from "./SweepPrint.tsx";

interface Props {
  stack: { name: string; program: string };
  swept: SweptView;
}

const WIDTH = 800;
const PLOT = 500;
const HEAD = 40;
const ROW = 18;
/** Letters that a line of the foot holds. */
const LINE = 118;

/** The drawing of a sweep that stands by itself: what it shows above it, its sentences below. */
export function SweepFile({ stack, swept }: Props) {
  const name = sweepName(swept);
  const foot = [`${stack.name} (${stack.program})`, ...[...swept.summary, ...swept.crossings].flatMap(inLines)];
  const height = HEAD + PLOT + ROW * (foot.length + 1);
  return (
    <svg
      xmlns="http://www.w3.org/2000/svg"
      width={WIDTH}
      height={height}
      viewBox={`0 0 ${WIDTH} ${height}`}
      fontFamily="'Noto Sans', Arial, sans-serif"
      fontSize="12.5"
    >
      <title>{name}</title>
      <rect width={WIDTH} height={height} fill="#ffffff" />
      {inLines(name).map((line, n) => (
        <text key={line} x="12" y={18 + n * 16} fontWeight="600" fontSize="14">
          {line}
        </text>
      ))}
      <svg y={HEAD} width={WIDTH} height={PLOT}>
        <SweepPrint swept={swept} width={WIDTH} height={PLOT} />
      </svg>
      {foot.map((line, n) => (
        <text key={line} x="12" y={HEAD + PLOT + ROW * (n + 1)} fontWeight={n === 0 ? 600 : 400}>
          {line}
        </text>
      ))}
    </svg>
  );
}

/** A sentence in lines that the drawing holds: an SVG breaks none. */
function inLines(sentence: string): string[] {
  const lines: string[] = [];
  for (const word of sentence.split(" ")) {
    const last = lines.at(-1);
    if (last !== undefined && last.length + word.length < LINE) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines;
}
