import { lineBarLayout } from "#app/components/drawings/line-bar-layout.ts";
import type { SheetDocument, SheetEngineers, SheetHands, SheetStepRow } from "#app/schemas/sheet-document.ts";
import type { Paper } from "../paper-size.ts";
import {
  BASIS,
  CAUTIONS_BLOCK,
  frameHeight,
  frameWidth,
  GROUP,
  GROUP_COLUMNS,
  INSET,
  LINES,
  RECORD,
  STEP_COLUMNS,
  STEP_ROW,
  TITLE_STRIP,
  titleColumn,
} from "./paper-geometry.ts";
import { linesOf, linesOfAll, widthOf } from "./paper-lines.ts";

type Group = SheetHands["groups"][number];

/**
 * What stands on one page. `record` is how many rows are left to write down what was measured. Both parts keep their order, and no
 * group and no step is parted.
 */
export type SheetPage =
  | { kind: "hands"; first: boolean; groups: Group[]; foot: boolean; record: number }
  | { kind: "engineers"; steps: SheetStepRow[]; basis: boolean };

/** The pages of a sheet: those for hands, then those for engineers, as many as each needs. */
export function sheetPlan(document: SheetDocument, paper: Paper): SheetPage[] {
  const { hands, engineers } = document;
  return [...handsPages(hands, paper), ...(engineers ? engineersPages(engineers, paper) : [])];
}

/** Room between the head of a page and its title block, less what the estimate of a page may be wrong by. */
const room = (paper: Paper) => frameHeight(paper) - TITLE_STRIP.height - SAFETY;
const SAFETY = 1;

function handsPages(hands: SheetHands, paper: Paper): SheetPage[] {
  const frame = frameWidth(paper);
  const identity = identityHeight(hands);
  const free = room(paper) - identity;
  let left = free - answerHeight(hands, frame) - barHeight(hands, frame) - deviationsHeight(hands, frame) - GROUPS_HEAD;
  let page: SheetPage & { kind: "hands" } = { kind: "hands", first: true, groups: [], foot: false, record: 0 };
  const pages = [page];
  const turn = () => {
    page = { kind: "hands", first: false, groups: [], foot: false, record: 0 };
    pages.push(page);
    left = free - GROUPS_HEAD;
  };
  for (const group of hands.groups) {
    const needed = groupHeight(group, frame);
    if (needed > left && (page.groups.length > 0 || page.first)) turn();
    page.groups.push(group);
    left -= needed;
  }
  const foot = footHeight(hands, frame);
  if (foot > left) {
    turn();
    left += GROUPS_HEAD;
  }
  page.foot = true;
  page.record = recordRows(left - foot);
  return pages;
}

/** How many rows there is room for to write down what was measured; none where they would be too few. */
function recordRows(free: number): number {
  const rows = Math.floor((free - RECORD.heading - RECORD.head) / RECORD.row);
  return rows < RECORD.least ? 0 : Math.min(RECORD.most, rows);
}

const GROUPS_HEAD = 4.8;

function identityHeight({ notices, effective }: SheetHands): number {
  return 1.6 + Math.max(2, notices.length + 1 + (effective === null ? 1 : 1)) * LINES.body.line;
}

function answerHeight({ answer, blocked }: SheetHands, frame: number): number {
  const lines = linesOf(answer, frame - 2 * INSET, LINES.answer.size, true);
  return 3.2 + lines * LINES.answer.line + (blocked ? 7.5 : 0);
}

function barHeight({ support }: SheetHands, frame: number): number {
  const { height, sizes } = lineBarLayout({ ...support, variant: "paper" });
  return (height / sizes.width) * frame + 0.3;
}

function deviationsHeight({ deviations }: SheetHands, frame: number): number {
  if (deviations.length === 0) return 0;
  return 1.8 + (1 + linesOfAll(deviations, frame - 2 * INSET, LINES.body.size)) * LINES.body.line;
}

/** What stands of a group in the first column. */
export function waferLines({ silicon, shape, hottest, runs, touch }: Group): string[] {
  return [`Silicon ${silicon}`, ...shape.map((line) => `Lies ${line}`), `Hottest ${hottest}`, ...runs, touch];
}

export const NO_DO_NOT = "Nothing beyond the site’s rules";

function groupHeight(group: Group, frame: number): number {
  const column = (share: number) => (frame * share) / 100 - 2 * GROUP.padX;
  const { wafer, stop, doNot } = GROUP_COLUMNS;
  const { size, line } = LINES.body;
  const tallest = Math.max(
    linesOfAll(waferLines(group), column(wafer), size),
    linesOfAll(group.stop.lines, column(stop), size, true) + linesOf(group.stop.how, column(stop), size),
    group.doNot.length === 0
      ? linesOf(NO_DO_NOT, column(doNot), size)
      : linesOfAll(group.doNot, column(doNot) - GROUP.marker, size),
  );
  return GROUP.head + (isLongHead(group, frame) ? line : 0) + tallest * line + GROUP.padBottom + 0.35;
}

/** Whether the head of a group takes two lines. */
export function isLongHead({ steps, support, heldBy, sideUp }: Group, frame: number): boolean {
  const words = widthOf(`Steps ${steps}`, 14, true) + widthOf(`${support}${heldBy ?? ""}${sideUp}`, 11, true);
  return words + GROUP.bow.width + 30 > frame * 0.93;
}

/** A line to write on needs this much, mm. */
export const WRITE_LINE = 6;

function footHeight(hands: SheetHands, frame: number): number {
  const { bonds, tapes, emergency } = hands;
  const bondLines = bonds.map((bond) => linesOf(bondWords(bond), frame - 2 * INSET - 62, LINES.body.size));
  const written = bondLines.reduce((sum, lines) => sum + WRITE_LINE + (lines - 1) * LINES.body.line, 0);
  const words = `${emergency.heading} ${emergency.text}${emergency.call === null ? "" : ` Call: ${emergency.call}`}`;
  const call = emergency.call === null ? WRITE_LINE : 0;
  const breaks = linesOf(words, frame - 2 * INSET, LINES.body.size) * LINES.body.line + call + 1.6;
  const support = bonds.length + tapes.length === 0 ? 0 : written + tapes.length * WRITE_LINE + 1.6;
  return support + cautionsHeight(hands, frame) + breaks + 1;
}

/** 'Glass carrier, adhesive, device side bonded; debond step 12, peel' */
export function bondWords({ carrier, material, face, debond }: SheetHands["bonds"][number]): string {
  return `${carrier}, ${material}${face ? `, ${face}` : ""}; debond ${debond}`;
}

/** Cautions in rows of three columns: the first, which is long, takes two of them. */
export function cautionRows(cautions: SheetHands["cautions"]): SheetHands["cautions"][] {
  const [first, ...rest] = cautions;
  if (!first) return [];
  const last = rest.pop();
  const rows = [[first, ...(last ? [last] : [])]];
  for (let at = 0; at < rest.length; at += 3) rows.push(rest.slice(at, at + 3));
  return rows;
}

export function cautionColumn(frame: number): number {
  return (frame - 2 * INSET) / 3;
}

function cautionsHeight({ cautions }: SheetHands, frame: number): number {
  const { sign, gap, rowGap } = CAUTIONS_BLOCK;
  const column = cautionColumn(frame) - sign - gap - 2;
  const rows = cautionRows(cautions).map((row, index) =>
    Math.max(
      ...row.map(({ text }, at) =>
        linesOf(text, index === 0 && at === 0 ? column + cautionColumn(frame) : column, LINES.body.size),
      ),
    ),
  );
  return rows.reduce((sum, lines) => sum + lines * LINES.body.line + rowGap, 0) + 1.6;
}

function engineersPages(engineers: SheetEngineers, paper: Paper): SheetPage[] {
  const free = room(paper) - ENGINEERS_HEAD;
  let left = free - STEP_ROW.head;
  let page: SheetPage & { kind: "engineers" } = { kind: "engineers", steps: [], basis: false };
  const pages = [page];
  for (const step of engineers.steps) {
    const needed = stepHeight(step, paper);
    if (needed > left && page.steps.length > 0) {
      page = { kind: "engineers", steps: [], basis: false };
      pages.push(page);
      left = free - STEP_ROW.head;
    }
    page.steps.push(step);
    left -= needed;
  }
  if (basisHeight(engineers, paper) > left) {
    page = { kind: "engineers", steps: [], basis: true };
    pages.push(page);
  }
  page.basis = true;
  return pages;
}

const ENGINEERS_HEAD = 8;

/** Height of a row of the step table, mm: drawn as it is planned. */
export function stepHeight(step: SheetStepRow, paper: Paper): number {
  const { size, line } = LINES.table;
  const inside = (width: number) => width - 2 * STEP_ROW.padX;
  const lines = Math.max(
    linesOf(step.title, inside(titleColumn(paper)), size),
    linesOfAll(hottestLines(step), inside(STEP_COLUMNS.hottest), size),
    linesOf(step.heldBy, inside(STEP_COLUMNS.heldBy) - 6, size, true),
    linesOfAll([step.warp, step.lies], inside(STEP_COLUMNS.warp), size),
    1 + (step.finding === null ? 0 : linesOf(step.finding, inside(STEP_COLUMNS.finding), size)),
  );
  return Math.max(STEP_ROW.least, lines * line + 2 * STEP_ROW.padY + 0.2);
}

/** Temperature, and the time at it under it. */
export function hottestLines({ hottest }: SheetStepRow): string[] {
  return hottest.split(", ");
}

/** Widths of the two columns under the step table, mm. */
export function basisColumns(paper: Paper): { plot: number; words: number } {
  return { plot: BASIS.plot.width + 2 * INSET, words: frameWidth(paper) - BASIS.plot.width - 2 * INSET };
}

function basisHeight(engineers: SheetEngineers, paper: Paper): number {
  const { plot, words } = basisColumns(paper);
  const { size, line } = LINES.table;
  const list = (texts: readonly string[], width: number) =>
    texts.length === 0 ? 0 : BASIS.heading + linesOfAll(texts, width - 2 * INSET - 3, size) * line + BASIS.pad;
  const drawn = engineers.plot ? BASIS.plot.height : 2 * line;
  const left = BASIS.heading + drawn + BASIS.pad + linesOf(engineers.meaning, plot - 2 * INSET, size) * line;
  const right =
    list(engineers.changes, words) +
    list(engineers.assumptions, words) +
    list([engineers.signs], words) +
    list(engineers.remarks, words);
  return Math.max(left, right) + 2 * BASIS.pad;
}
