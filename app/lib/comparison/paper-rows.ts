import type { ComparedGroup, ComparedRow, ComparedWords } from "#app/schemas/comparison.ts";
import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "../paper-size.ts";

/** Width of the heads of rows, mm. */
export const HEAD_COLUMN = 34;
/** Line pitch of the table and what its cells add, mm; advance of a letter of 8 pt. */
const LINE = 3.6;
const PADDING = 1.1;
const LETTER = 1.55;
/** What stands above and below the table besides plot and crossings: answer, names, heads, title block, mm. */
const AROUND = 84;
/** Height of the plot, mm. */
export const PLOT_HEIGHT = 74;
/** As many sentences on crossings as one page takes. */
const MOST_CROSSINGS = 6;
const linesIn = (text: string, width: number) => Math.max(1, Math.ceil((text.length * LETTER) / width));

/**
 * What of a comparison one page holds: all figures first, then what differs of the rest, until it is full.
 * @param members how many are compared
 * @param figureGroups how many groups, which come first, are figures
 */
export function paperRows(
  { groups: all, crossings, sensitivities }: Pick<ComparedWords, "groups" | "crossings" | "sensitivities">,
  { members, figureGroups, paper }: { members: number; figureGroups: number; paper: Paper },
): { groups: ComparedGroup[]; crossings: ComparedWords["crossings"]; moreRows: number; moreCrossings: number } {
  const { width, height } = PAPERS[paper];
  const frame = width - FILING_MARGIN - MARGIN;
  const column = (frame - HEAD_COLUMN) / members - 2;
  const crossing = crossings.filter(({ numbers }) => numbers.length > 0);
  const shown = (crossings.length > MOST_CROSSINGS ? crossing : crossings).slice(0, MOST_CROSSINGS);
  const sentences = shown.reduce((sum, { sentence }) => sum + linesIn(sentence, frame - 6) * LINE, 0);
  const rowHeight = ({ label, cells }: ComparedRow) =>
    Math.max(linesIn(label, HEAD_COLUMN - 2), ...cells.map(({ text }) => linesIn(text, column))) * LINE + PADDING;
  let left = height - 2 * MARGIN - PLOT_HEIGHT - AROUND - sentences;
  let moreRows = 0;
  const figures = [...all.slice(0, figureGroups), moverGroup(sensitivities)];
  const groups = [...figures, ...all.slice(figureGroups)];
  const kept = groups.map((group, n) => {
    const wanted = n < figures.length ? group.rows : group.rows.filter(({ differs }) => differs);
    const rows: ComparedRow[] = [];
    for (const row of wanted) {
      const needed = rowHeight(row) + (rows.length === 0 ? LINE + PADDING : 0);
      if (needed > left) moreRows += 1;
      else {
        rows.push(row);
        left -= needed;
      }
    }
    return { ...group, rows };
  });
  return {
    groups: kept.filter(({ rows }) => rows.length > 0),
    crossings: shown,
    moreRows,
    moreCrossings: Math.max(0, crossing.length - shown.length),
  };
}

const MOVERS = ["Most", "Next"];

/** The two inputs of each that move its warp most, as rows: the screen has five, with bars. */
function moverGroup(sensitivities: ComparedWords["sensitivities"]): ComparedGroup {
  return {
    key: "movers",
    title: "What moves the warp most, by its tolerance",
    rows: MOVERS.map((label, place) => ({
      key: label,
      label,
      differs: false,
      cells: sensitivities.map(({ lines, remark }) => {
        const line = lines[place];
        const none = place === 0 ? (remark ?? "–") : "–";
        return {
          text: line ? `${line.input} ${line.tolerance} moves it ${line.moves}` : none,
          note: null,
          differs: false,
        };
      }),
    })),
  };
}
