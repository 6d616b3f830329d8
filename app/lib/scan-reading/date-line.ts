import { excerpt } from "#app/lib/excerpt.ts";
import type { DateOrder, ReadDate } from "./reading.ts";

const MONTHS = ["jan", "feb", "mar", "apr", "may", "jun", "jul", "aug", "sep", "oct", "nov", "dec"];
const YEAR_FIRST = /\b(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})\b/;
const YEAR_LAST = /\b(\d{1,2})[-/.](\d{1,2})[-/.](\d{4})\b/;
const NAMED = /\b(\d{1,2})[-. ]+([A-Za-z]{3})[a-z]*[-., ]+(\d{4})\b/;
const NAMED_FIRST = /\b([A-Za-z]{3})[a-z]*\.? (\d{1,2}),? (\d{4})\b/;

/** The first line above the data that holds a date; its day stays open when day and month could be either way round. */
export function dateLine(lines: readonly string[], order: DateOrder | undefined): ReadDate | null {
  for (const [n, line] of lines.entries()) {
    const found = dayIn(line, order);
    if (found !== undefined) return { row: n + 1, text: excerpt(line, 60), day: found };
  }
  return null;
}

function dayIn(line: string, order: DateOrder | undefined): string | null | undefined {
  const first = YEAR_FIRST.exec(line);
  if (first) return isoDay(first[1], first[2], first[3]);
  const named = NAMED.exec(line);
  const namedMonth = monthOf(named?.[2]);
  if (named && namedMonth > 0) return isoDay(named[3], namedMonth, named[1]);
  const american = NAMED_FIRST.exec(line);
  const americanMonth = monthOf(american?.[1]);
  if (american && americanMonth > 0) return isoDay(american[3], americanMonth, american[2]);
  const last = YEAR_LAST.exec(line);
  if (!last) return undefined;
  const [, one, two, year] = last;
  if (Number(one) > 12 || one === two) return isoDay(year, two, one);
  if (Number(two) > 12) return isoDay(year, one, two);
  return order === "dmy" ? isoDay(year, two, one) : order === "mdy" ? isoDay(year, one, two) : null;
}

const monthOf = (name: string | undefined) => MONTHS.indexOf((name ?? "").toLowerCase()) + 1;

function isoDay(year: string | undefined, month: string | number | undefined, day: string | undefined) {
  const [m, d] = [Number(month), Number(day)];
  if (m < 1 || m > 12 || d < 1 || d > 31) return undefined;
  return `${year}-${String(m).padStart(2, "0")}-${String(d).padStart(2, "0")}`;
}
