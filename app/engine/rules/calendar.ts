import { EngineInputError } from "../errors.ts";

const FORM = /^(\d{4})-(\d{2})-(\d{2})(?:T.*)?$/;

const isLeap = (year: number) => (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
const lengthOf = (year: number, month: number) =>
  month === 2 ? (isLeap(year) ? 29 : 28) : [4, 6, 9, 11].includes(month) ? 30 : 31;

/**
 * Day number of an ISO date in the Gregorian calendar, for differences only; a time of day is left out.
 * @throws EngineInputError for what is no such date
 */
export function dayOf(field: string, text: string): number {
  const [, ...parts] = FORM.exec(text) ?? [];
  const [year = 0, month = 0, day = 0] = parts.map(Number);
  if (month < 1 || month > 12 || day < 1 || day > lengthOf(year, month))
    throw new EngineInputError(field, `'${text}' is not a date`, "YYYY-MM-DD");
  const before = year - 1;
  const leapDays = Math.floor(before / 4) - Math.floor(before / 100) + Math.floor(before / 400);
  let days = 365 * before + leapDays + day;
  for (let past = 1; past < month; past++) days += lengthOf(year, past);
  return days;
}
