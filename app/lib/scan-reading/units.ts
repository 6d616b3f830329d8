import type { ReadUnit } from "./reading.ts";

export type Dimension = "length" | "stress" | "angle";

interface UnitOfFile {
  dimension: Dimension;
  /** SI value = value × times / over; both whole, so that each rounds once */
  times: number;
  over: number;
}

const length = (times: number, over: number): UnitOfFile => ({ dimension: "length", times, over });
const stress = (times: number, over = 1): UnitOfFile => ({ dimension: "stress", times, over });

const UNITS: Record<ReadUnit, UnitOfFile> = {
  m: length(1, 1),
  cm: length(1, 1e2),
  mm: length(1, 1e3),
  µm: length(1, 1e6),
  nm: length(1, 1e9),
  Å: length(1, 1e10),
  inch: length(254, 1e4),
  mil: length(254, 1e7),
  Pa: stress(1),
  MPa: stress(1e6),
  GPa: stress(1e9),
  "dyn/cm²": stress(1, 10),
  "1E9 dyn/cm²": stress(1e8),
  "1E10 dyn/cm²": stress(1e9),
  "1E11 Pa": stress(1e11),
  "°": { dimension: "angle", times: Math.PI, over: 180 },
  rad: { dimension: "angle", times: 1, over: 1 },
};

export const dimensionOf = (unit: ReadUnit): Dimension => UNITS[unit].dimension;

/** What to multiply a file's number with, and then divide by, for SI. */
export const factorsOf = (unit: ReadUnit): { times: number; over: number } => UNITS[unit];

/** A file's number in SI. */
export const inSi = (value: number, unit: ReadUnit): number => (value * UNITS[unit].times) / UNITS[unit].over;

/** Units as files write them. A spelling that is cased is looked up as it stands first: 'mm' is no 'MM', but 'UM' is 'µm'. */
const SPELLINGS = new Map<string, ReadUnit>([
  ...(["m", "cm", "mm", "µm", "nm", "Å", "inch", "mil", "Pa", "MPa", "GPa", "°", "rad"] as const).map(
    (unit) => [unit, unit] as const,
  ),
  ["μm", "µm"],
  ["Âµm", "µm"],
  ["um", "µm"],
  ["UM", "µm"],
  ["MM", "mm"],
  ["NM", "nm"],
  ["micron", "µm"],
  ["microns", "µm"],
  ["micrometer", "µm"],
  ["micrometre", "µm"],
  ["millimeter", "mm"],
  ["millimetre", "mm"],
  ["A", "Å"],
  ["\u212B", "Å"],
  ["Ang", "Å"],
  ["ang", "Å"],
  ["angstrom", "Å"],
  ["Angstrom", "Å"],
  ["Angstroms", "Å"],
  ["in", "inch"],
  ["inches", "inch"],
  ["mils", "mil"],
  ["deg", "°"],
  ["degree", "°"],
  ["degrees", "°"],
  ["mpa", "MPa"],
  ["gpa", "GPa"],
]);

/** Lengths that files may name and this program does not read. */
const NOT_READ = ["pm", "km", "fm", "µin", "uin", "ft", "thou"];

/** The unit that a whole text is, such as 'um', '[mm]' or '1E9 dyn/cm2'; its own text when it is a unit that is not read. */
export function unitOf(text: string): ReadUnit | { notRead: string } | null {
  const bare = text
    .trim()
    .replace(/^[([{<]\s*|\s*[)\]}>]$/g, "")
    .trim();
  return SPELLINGS.get(bare) ?? dynesOrPascals(bare) ?? (NOT_READ.includes(bare) ? { notRead: bare } : null);
}

const POWERED = /^(?:1(?:\.0)?\s*)?[x×*]?\s*(?:E\+?|10\^?)0?(\d{1,2})\s*[x×*]?\s*(.+)$/i;

function dynesOrPascals(text: string): ReadUnit | null {
  const powered = POWERED.exec(text);
  const base = (powered?.[2] ?? text).replace(/\s+/g, "");
  const dynes = /^dyne?s?\/cm(?:\^?2|²)$/i.test(base);
  if (!powered) return dynes ? "dyn/cm²" : null;
  const power = Number(powered[1]);
  if (dynes && (power === 9 || power === 10)) return power === 9 ? "1E9 dyn/cm²" : "1E10 dyn/cm²";
  if (base !== "Pa") return null;
  return power === 11 ? "1E11 Pa" : power === 9 ? "GPa" : power === 6 ? "MPa" : null;
}

/** After a blank, comma or underline only what cannot be the end of a word: 'z_nm', not 'lead in' or 'z_m'. */
const NOT_TRAILING = ["m", "in", "A", "Ang", "ang", "rad", "deg"];
const BRACKETED = /[([{]\s*([^()[\]{}]+?)\s*[)\]}]/g;

/** The unit that the head of a column names, such as nm in 'z (nm)', 'z / nm', 'z_nm' or 'nm' alone; null for none. */
export function unitInHead(head: string): ReadUnit | { notRead: string } | null {
  const text = head.trim().replace(/[,;]+$/, "");
  const whole = unitOf(text);
  if (whole !== null && text !== "A") return whole;
  for (const [, inside = ""] of text.matchAll(BRACKETED)) {
    const unit = unitOf(inside);
    if (unit !== null) return unit;
  }
  const slashed = /\/\s*([^/]+)$/.exec(text)?.[1];
  const afterSlash = slashed === undefined ? null : unitOf(slashed);
  if (afterSlash !== null) return afterSlash;
  const trailing = /[\s_,](\S+)$/.exec(text)?.[1];
  return trailing === undefined || NOT_TRAILING.includes(trailing) ? null : unitOf(trailing);
}

/** A head without its unit. */
export function headWithoutUnit(head: string): string {
  const text = head.trim().replace(/[,;]+$/, "");
  const unbracketed = text.replace(BRACKETED, (all, inside: string) => (unitOf(inside) === null ? all : " ")).trim();
  const trailing = /^(.*?)\s*(?:\/|[\s_,])\s*(\S+)$/.exec(unbracketed);
  const [, word = "", unit = ""] = trailing ?? [];
  return word !== "" && unitOf(unit) !== null && !(NOT_TRAILING.includes(unit) && !unbracketed.includes("/"))
    ? word
    : unbracketed;
}
