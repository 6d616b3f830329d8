import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "../paper-size.ts";

/** Widths and heights on the sheet's paper, mm: what pages are planned by is what they are drawn by. */
export const FRAME_LINE = 0.5;

/** Width inside the frame. */
export function frameWidth(paper: Paper): number {
  return PAPERS[paper].width - FILING_MARGIN - MARGIN - 2 * FRAME_LINE;
}

/** Height inside the frame. */
export function frameHeight(paper: Paper): number {
  return PAPERS[paper].height - 2 * MARGIN - 2 * FRAME_LINE;
}

/** Title block with the code at its left. */
export const TITLE_STRIP = { height: 31.4, block: 112, code: 28, rows: [7.5, 8.7, 7.6, 7.6] } as const;

/** Clear space at the left and right of what stands in the frame. */
export const INSET = 3;

/** A size of type, pt, and its line, mm. */
const POINT = 25.4 / 72;
export const LINES = {
  table: { size: 8, line: 9.6 * POINT },
  body: { size: 11, line: 13.2 * POINT },
  answer: { size: 16, line: 20.5 * POINT },
} as const;

/** Columns of the groups in parts of a hundred; initials take the rest. */
export const GROUP_COLUMNS = { wafer: 33.3, stop: 21, doNot: 39.2, initials: 6.5 } as const;

export const GROUP = { head: 7.8, padX: 1.2, padBottom: 1.2, marker: 2.6, bow: { width: 24.5, height: 6.1 } } as const;

/** Columns of the step table; what is done takes the rest. */
export const STEP_COLUMNS = {
  number: 9,
  silicon: 12,
  hottest: 14,
  heldBy: 25,
  bow: 17,
  warp: 24,
  limit: 10.5,
  finding: 29,
} as const;

export const STEP_ROW = { least: 7.2, padX: 1.1, padY: 0.25, head: 8, bow: { width: 14.8, height: 6.2 } } as const;

/** Width of the column that says what is done. */
export function titleColumn(paper: Paper): number {
  return frameWidth(paper) - Object.values(STEP_COLUMNS).reduce((sum, width) => sum + width, 0);
}

/** The part under the step table: the plot at the left, words at the right. */
export const BASIS = { plot: { width: 104, height: 46, alone: 96 }, pad: 1.6, heading: 5 } as const;

/** Room to write down what was measured, where a page for hands has it. */
export const RECORD = { heading: 6.4, head: 5.4, row: 8.2, least: 3, most: 14 } as const;

/** Three columns of cautions: the first of them is two wide. */
export const CAUTIONS_BLOCK = { sign: 5.2, gap: 1.4, rowGap: 0.4 } as const;
