import { runsOf } from "./runs-of.ts";
import { stackRows } from "./stack-rows.ts";
import { textWidth } from "./text-width.ts";

/** A planned support over a run of steps. */
export interface PlannedSpan {
  text: string;
  /** Index of the first step, and after the last. */
  from: number;
  to: number;
  /** null: the words stand in the gap of the dimension line; otherwise in this row beneath it. */
  row: number | null;
}

/** Arrows, extension lines and a little line on both sides of the words, px. */
const LINE_ROOM = 38;
/** Row pitch as a multiple of the text size. */
export const PLANNED_ROW_PITCH = 1.28;

/** Planned supports as spans, each with the place of its words: in the line where they fit, beneath it where not. */
export function plannedSpans(
  planned: readonly (string | null)[],
  columnWidth: number,
  textSize: number,
): PlannedSpan[] {
  const runs = runsOf(planned).flatMap(({ value, from, to }) => {
    if (value === null) return [];
    const width = textWidth(value, textSize);
    return [{ text: value, from, to, width, fits: width + LINE_ROOM <= (to - from) * columnWidth }];
  });
  const beneath = runs.filter((run) => !run.fits);
  const rows = stackRows(
    beneath.map((run) => run.from * columnWidth),
    beneath.map((run) => run.width),
  );
  return runs.map((run) => ({
    text: run.text,
    from: run.from,
    to: run.to,
    row: run.fits ? null : (rows[beneath.indexOf(run)] ?? 0),
  }));
}

/** Height of the rows beneath the line, px: 0 when all words stand in their gaps. */
export function plannedRowsHeight(planned: readonly (string | null)[], columnWidth: number, textSize: number): number {
  const rows = plannedSpans(planned, columnWidth, textSize).map((span) => (span.row === null ? 0 : span.row + 1));
  return Math.max(0, ...rows) * textSize * PLANNED_ROW_PITCH;
}
