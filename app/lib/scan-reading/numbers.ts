import type { DecimalMark, Thousands } from "./reading.ts";

/** A cell's number, or NaN for anything else. */
export type NumberReader = (cell: string) => number;

const POWER = String.raw`(?:[eEdD][+-]?\d+)?`;
const POINT = new RegExp(String.raw`^[+-]?(?:\d+\.?\d*|\.\d+)${POWER}$`);
const WHOLE = new RegExp(String.raw`^[+-]?\d+${POWER}$`);
const GROUPED: Record<Exclude<Thousands, "none">, RegExp> = {
  comma: /^[+-]?\d{1,3}(?:,\d{3})+(?!\d)/,
  point: /^[+-]?\d{1,3}(?:\.\d{3})+(?!\d)/,
  blank: /^[+-]?\d{1,3}(?:[ \u00A0\u202F\u2009]\d{3})+(?!\d)/,
  apostrophe: /^[+-]?\d{1,3}(?:['\u2019]\d{3})+(?!\d)/,
};
const GROUP_SIGNS = /[,. \u00A0\u202F\u2009'\u2019]/g;

const plain = (cell: string) => cell.trim().replace("\u2212", "-");
const isDigit = (code: number) => code >= 48 && code <= 57;

/** A number with a decimal point, its usual forms without a regular expression: millions of cells pass here. */
function pointNumber(cell: string): number {
  const first = cell.charCodeAt(0);
  if (isDigit(first) || first === 45 || first === 46 || first === 43) {
    const value = +cell;
    // A letter in second place may be that of a hexadecimal number.
    if (value - value === 0 && !(cell.charCodeAt(1) > 57)) return value;
  }
  return slowNumber(plain(cell));
}

function slowNumber(text: string): number {
  if (!POINT.test(text)) return NaN;
  const value = Number(text.replace(/[dD]/, "e"));
  return Number.isFinite(value) ? value : NaN;
}

function commaNumber(cell: string): number {
  const at = cell.indexOf(",");
  if (cell.includes(".")) return NaN;
  // A comma sets off decimals, so something follows it.
  if (at < 0) return pointNumber(cell);
  return isDigit(cell.charCodeAt(at + 1)) ? pointNumber(`${cell.slice(0, at)}.${cell.slice(at + 1)}`) : NaN;
}

function wholeNumber(cell: string): number {
  const text = plain(cell);
  return WHOLE.test(text) ? slowNumber(text) : NaN;
}

/**
 * Reads numbers under a decimal mark and a grouping of thousands. Without a mark only whole numbers are numbers.
 */
export function numberReader(mark: DecimalMark | null, thousands: Thousands): NumberReader {
  const read = mark === null ? wholeNumber : mark === "point" ? pointNumber : commaNumber;
  if (thousands === "none") return read;
  const grouped = GROUPED[thousands];
  return (cell) => {
    const value = read(cell);
    const ownMark = thousands === "point" || thousands === "comma";
    // '1,234' would be a number without its grouping too, so the grouping comes first.
    if (value === value && !(ownMark && cell.includes(thousands === "point" ? "." : ","))) return value;
    const text = plain(cell);
    const start = grouped.exec(text)?.[0];
    return start === undefined ? value : read(start.replace(GROUP_SIGNS, "") + text.slice(start.length));
  };
}

/** Words that instruments write for a value they do not have. */
const NO_VALUE =
  /^(?:[+-]?(?:nan|inf|infinity)|1\.#(?:qnan|ind|inf)\w*|#?n\/?a|#value!|#div\/0!|null|nil|none|missing|bad|invalid|no ?data|overflow|error|[-*?.]+)$/i;

export const isMissing = (cell: string) => cell.trim() === "" || NO_VALUE.test(cell.trim());

/** What a spreadsheet would run: '=1+1', '@SUM(A1)', '+cmd|…', '-A1'. A number or a dash is none. */
export function isFormula(cell: string): boolean {
  const text = cell.trim();
  if (/^=[^=\s]/.test(text) || /^@\w+\s*\(/.test(text)) return true;
  return (
    /^[+-]+\s*(?:[A-Za-z$]+\$?\d+\b|[A-Za-z]+\s*[(|!]|\d[\d.]*\s*[-+*/(]|[@=(])/.test(text) &&
    !/^[+-]?\d[\d.,]*[eEdD]?[+-]?\d*$/.test(text)
  );
}

/**
 * Whether a cell could be a number: under the mark, or under either when it is not known. '1,234' could under both, as a large
 * number whose thousands are grouped.
 */
export function looksNumeric(cell: string, mark: DecimalMark | null, blanksGroup: boolean): boolean {
  const { kind, thousands } = markEvidence(cell);
  if (kind === null || (thousands === "blank" && !blanksGroup)) return false;
  return mark === null || kind === mark || !["point", "comma"].includes(kind);
}

export interface MarkEvidence {
  /** the decimal mark that the cell proves; 'either …' when that sign could also group thousands; null when it is no number */
  kind: DecimalMark | "none" | "either point" | "either comma" | null;
  thousands: Thousands;
}

const NO_NUMBER: MarkEvidence = { kind: null, thousands: "none" };
const BODY = /^[+-]?([\d.,'\u2019 \u00A0\u202F\u2009]+)([eEdD][+-]?\d+)?$/;

/** What one cell says of the marks of its file. */
export function markEvidence(cell: string): MarkEvidence {
  const match = BODY.exec(plain(cell));
  const body = match?.[1]?.trim();
  if (match === null || body === undefined || !/\d/.test(body)) return NO_NUMBER;
  if (/^\d+$/.test(body)) return { kind: "none", thousands: "none" };
  const points = body.split(".").length - 1;
  const commas = body.split(",").length - 1;
  const other = /['\u2019]/.test(body) ? "apostrophe" : /\s/.test(body) ? "blank" : null;
  if (other !== null) return groupedByOther(body, other, points, commas);
  if (points > 0 && commas > 0) {
    const last = body.lastIndexOf(".") > body.lastIndexOf(",") ? "point" : "comma";
    const groups = last === "point" ? "comma" : "point";
    if ((last === "point" ? points : commas) > 1 || !GROUPED[groups].test(body)) return NO_NUMBER;
    return { kind: last, thousands: groups };
  }
  const sign = points > 0 ? "point" : "comma";
  if (points + commas > 1) {
    const start = GROUPED[sign].exec(body)?.[0];
    return start === body ? { kind: sign === "point" ? "comma" : "point", thousands: sign } : NO_NUMBER;
  }
  if (sign === "comma" && body.endsWith(",")) return NO_NUMBER;
  const couldGroup = match[2] === undefined && /^[1-9]\d{0,2}[.,]\d{3}$/.test(body);
  return { kind: couldGroup ? `either ${sign}` : sign, thousands: "none" };
}

function groupedByOther(body: string, thousands: "apostrophe" | "blank", points: number, commas: number): MarkEvidence {
  const start = GROUPED[thousands].exec(body)?.[0];
  if (start === undefined || points + commas > 1) return NO_NUMBER;
  const tail = body.slice(start.length);
  if (tail !== "" && !/^[.,]\d*$/.test(tail)) return NO_NUMBER;
  return { kind: tail === "" ? "none" : points > 0 ? "point" : "comma", thousands };
}
