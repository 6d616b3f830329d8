import { colour } from "#app/components/drawings/colour.ts";
import { textWidth } from "#app/components/drawings/text-width.ts";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { MARK_LINE, markPlace } from "#app/lib/sheet/mark-place.ts";

/** Words across a page in outline: nobody works from it unaware, and what lies under them stays legible. The page says them too. */
export function OutlineMark({ words, paper }: { words: string; paper: Paper }) {
  const { width, height } = PAPERS[paper];
  const { x, y, angle, size } = markPlace(paper, textWidth(words, 1, true));
  return (
    <svg
      className="sheet-mark sheet-paper-only"
      viewBox={`0 0 ${width} ${height}`}
      aria-hidden="true"
      style={{ position: "absolute", inset: 0, width: "100%", height: "100%", pointerEvents: "none" }}
    >
      <text
        x={x}
        y={y + size * 0.26}
        textAnchor="middle"
        transform={`rotate(${angle} ${x} ${y})`}
        style={{ fontSize: size, fontWeight: 600, fill: "none", stroke: colour("ink"), strokeWidth: MARK_LINE }}
      >
        {words}
      </text>
    </svg>
  );
}
