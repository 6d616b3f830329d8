import type { ComparedGroup, ComparedRow, ComparedWords } from "#app/schemas/comparison.ts";
import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "../paper-size.ts";

/** Width of the heads of rows, mm. */
export const HEAD_COLUMN = 34;
/** Line pitch of the table and what its cells add, mm; advance of a letter of 8 pt. */
const LINE = 3.6;
const PADDING = 1.1;
const LETTER = 1.55;
/** Line pitch and letter of the answer, which is set at 12 pt, and the pitch of the lines of names, two to a line, mm. */
const ANSWER_LINE = 5.3;
const ANSWER_LETTER = 2.4;
const NAMES_LINE = 4.4;
/** What stands above and below the table besides answer, names, plot and crossings: heads, remarks, title block, mm. */
const AROUND = 62;
/** Height of the plot, mm. */
export const PLOT_HEIGHT = 74;
/** As many sentences on crossings as one page takes, and their height, mm: they leave room for the figures. */
const MOST_CROSSINGS = 6;
const CROSSINGS_HEIGHT = 24;

/** Lines that a text takes: a word that does not fit goes to the next, as it does on paper. */
function linesIn(text: string, width: number, letter = LETTER): number {
  let lines = 1;
  let left = width;
  for (const word of text.split(" ")) {
    const needed = word.length * letter;
    if (needed > left && left < width) {
      lines += 1;
      left = width;
    }
    left -= needed + letter;
  }
  return lines;
}

/**
 * What of a comparison one page holds: all figures first, then what differs of the rest, until it is full.
 * @param names what is compared, as it is named at its mark
 * @param figureGroups how many groups, which come first, are figures
 * @param answer what stands over everything
 */
export function paperRows(
  { groups: all, crossings, sensitivities }: Pick<ComparedWords, "groups" | "crossings" | "sensitivities">,
  {
    names,
    figureGroups,
    paper,
    answer,
  }: { names: readonly string[]; figureGroups: number; paper: Paper; answer: string },
): { groups: ComparedGroup[]; crossings: ComparedWords["crossings"]; moreRows: number; moreCrossings: number } {
  const { width, height } = PAPERS[paper];
  const frame = width - FILING_MARGIN - MARGIN;
  const column = (frame - HEAD_COLUMN) / names.length - 2;
  const crossing = crossings.filter(({ numbers }) => numbers.length > 0);
  const wanted = (crossings.length > MOST_CROSSINGS ? crossing : crossings).slice(0, MOST_CROSSINGS);
  const shown: typeof wanted = [];
  let sentences = 0;
  for (const each of wanted) {
    const needed = linesIn(each.sentence, frame - 6) * LINE;
    if (sentences + needed > CROSSINGS_HEIGHT) break;
    shown.push(each);
    sentences += needed;
  }
  const rowHeight = ({ label, cells }: ComparedRow) =>
    Math.max(linesIn(label, HEAD_COLUMN - 2), ...cells.map(({ text }) => linesIn(text, column))) * LINE + PADDING;
  const besideMark = (frame - 9) / 2 - 13;
  const nameLines = names
    .map((name) => linesIn(name, besideMark))
    .reduce(
      // Two stand beside each other: the longer of them counts.
      (sum, lines, place, each) => (place % 2 === 0 ? sum + Math.max(lines, each[place + 1] ?? 0) : sum),
      0,
    );
  const head = linesIn(answer, frame - 6, ANSWER_LETTER) * ANSWER_LINE + nameLines * NAMES_LINE;
  let left = height - 2 * MARGIN - PLOT_HEIGHT - AROUND - head - sentences;
  let moreRows = 0;
  const figures = [...all.slice(0, figureGroups), moverGroup(sensitivities)];
  const groups = [...figures, ...all.slice(figureGroups)];
  const kept = groups.map((group, n) => {
    const offered = n < figures.length ? group.rows : group.rows.filter(({ differs }) => differs);
    const rows: ComparedRow[] = [];
    for (const row of offered) {
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
    moreCrossings: crossing.filter((each) => !shown.includes(each)).length,
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
