import { lineBarLayout } from "#app/components/drawings/line-bar-layout.ts";
import { textWidth } from "#app/components/drawings/text-width.ts";
import { wrapText } from "#app/components/drawings/wrap-text.ts";
import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "./paper-size.ts";
import type { SheetGroupView, SheetView } from "./sheet-view.ts";

/** Which groups stand on a page; the last page has what follows them. */
export interface SheetPagePlan {
  groups: SheetGroupView[];
  foot: boolean;
}

/** Shares of the table's columns, %; initials take the rest. */
export const GROUP_COLUMNS = { wafer: 34, stop: 18, doNot: 41, initials: 7 } as const;

const PX_PER_MM = 96 / 25.4;
const BODY = { size: 11 / 0.75, line: 14 * 0.3528 };
const ANSWER = { size: 16 / 0.75, line: 20.5 * 0.3528 };

/**
 * Heights in mm, measured on the printed page: nothing can be measured where this runs. `safety` is what the estimate of wrapped
 * lines may be wrong by; a page that still ran over would go on to another sheet of paper, nothing is ever cut off.
 */
const HEIGHTS = {
  identity: 11.8,
  changedSince: 5,
  answer: 4,
  blocked: 8,
  tableHead: 5.3,
  groupHead: 7.7,
  groupHeadLine: 7,
  groupRest: 2,
  writeIn: 6,
  footRest: 2.5,
  cautions: 51.2,
  titleBlock: 41.5,
  safety: 3,
} as const;

/** The sheet over as few pages as it needs: groups stay whole and in order, what follows them stands on the last page. */
export function sheetPages(sheet: SheetView, paper: Paper): SheetPagePlan[] {
  const { width, height } = PAPERS[paper];
  const frame = width - FILING_MARGIN - MARGIN;
  const identity = HEIGHTS.identity + (sheet.changedSince === null ? 0 : HEIGHTS.changedSince);
  const room = height - 2 * MARGIN - identity - HEIGHTS.titleBlock - HEIGHTS.safety;
  let left = room - answerHeight(sheet, frame) - barHeight(sheet, frame) - HEIGHTS.tableHead;
  let page: SheetPagePlan = { groups: [], foot: false };
  const pages = [page];
  const turn = () => {
    page = { groups: [], foot: false };
    pages.push(page);
    left = room - HEIGHTS.tableHead;
  };
  for (const group of sheet.groups) {
    const needed = groupHeight(group, frame);
    if (needed > left && (page.groups.length > 0 || pages.length === 1)) turn();
    page.groups.push(group);
    left -= needed;
  }
  if (footHeight(sheet, frame) > left) turn();
  page.foot = true;
  return pages;
}

const lines = (text: string, width: number, { size }: { size: number }, semibold = false) =>
  wrapText(text, width * PX_PER_MM, size, 20, semibold).length;

const widthOf = (text: string, size: number, semibold = false) => textWidth(text, size, semibold) / PX_PER_MM;

function answerHeight({ answer, blocked }: SheetView, frame: number): number {
  return HEIGHTS.answer + lines(answer, frame - 7, ANSWER, true) * ANSWER.line + (blocked ? HEIGHTS.blocked : 0);
}

function barHeight({ support }: SheetView, frame: number): number {
  const { height, sizes } = lineBarLayout({ ...support, variant: "paper" });
  return (height / sizes.width) * frame;
}

function groupHeight(group: SheetGroupView, frame: number): number {
  const column = (share: number) => (frame * share) / 100 - 3.2;
  const all = (texts: readonly string[], width: number, semibold = false) =>
    texts.reduce((sum, text) => sum + lines(text, width, BODY, semibold), 0);
  const { wafer, stop, doNot } = GROUP_COLUMNS;
  const tallest = Math.max(
    all(waferLines(group), column(wafer)),
    all(group.stop.lines, column(stop), true) + all([group.stop.how], column(stop)),
    all(group.doNot, column(doNot) - 3),
  );
  const { steps, support, heldBy, sideUp } = group;
  const headWidth =
    widthOf(`Steps ${steps}`, 14 / 0.75, true) +
    widthOf(`${support}${heldBy ?? ""}${sideUp}`, BODY.size, true) +
    SIGN_AND_GAPS;
  const head = HEIGHTS.groupHead + (headWidth > frame * 0.93 ? HEIGHTS.groupHeadLine : 0);
  return head + tallest * BODY.line + HEIGHTS.groupRest;
}

/** Swatch, bow line and the gaps between the parts of a group's head, mm. */
const SIGN_AND_GAPS = 52;

/** What stands of a group in the first column. */
export function waferLines({ silicon, shape, hottest, runs, touch }: SheetGroupView): string[] {
  return [`Silicon ${silicon}`, ...shape.map((line) => `Lies ${line}`), `Hottest ${hottest}`, ...runs, touch];
}

function footHeight({ bonds, tapes }: SheetView, frame: number): number {
  const bondLines = bonds.map(({ face, carrier, material, debond }) =>
    widthOf(`${carrier}, ${material}${face ? `, ${face}` : ""}; debond ${debond}`, BODY.size) > frame - 75 ? 2 : 1,
  );
  const writeIns = bondLines.reduce<number>((sum, each) => sum + each, tapes.length);
  return writeIns * HEIGHTS.writeIn + HEIGHTS.footRest + HEIGHTS.cautions;
}
