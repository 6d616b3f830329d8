import { fromSi, toSi } from "./convert.ts";
import { DIMENSIONS, findUnit, type Dimension, type DimensionDefinition, type UnitDefinition } from "./dimensions.ts";
import { showQuantity } from "./format.ts";
import { readNumber, type DecimalMark } from "./read-number.ts";

export type QuantityReading =
  | {
      ok: true;
      /** SI */
      value: number;
      /** How it was understood, such as '5.2 GPa'. */
      understood: string;
      /** Symbol of the unit that it was typed in. */
      unit: string;
    }
  | { ok: false; code: QuantityFault; message: string };

export type QuantityFault =
  /** Nothing was typed: missing, which is not zero. */
  | "blank"
  | "not-a-number"
  /** The comma may set off decimals or thousands. */
  | "ambiguous"
  /** A mark that is not the one agreed on. */
  | "decimal-mark"
  | "missing-unit"
  | "unknown-unit"
  /** A unit, but of something else. */
  | "other-dimension"
  /** Right letters, wrong case: mPa and MPa are a thousand million apart. */
  | "case"
  | "out-of-range";

/**
 * Reads a quantity as somebody typed it: a number and a unit of the given dimension, in any of the usual spellings. A strict
 * grammar takes number and unit apart; nothing is evaluated. A blank is missing, never zero; a unit is required except for
 * fractions and numbers. On failure `message` is a sentence that says what to type.
 */
export function parseQuantity(
  text: string,
  dimension: Dimension,
  options: { decimalMark?: DecimalMark } = {},
): QuantityReading {
  const typed = plain(text);
  if (typed === "") return { ok: false, code: "blank", message: "Nothing is typed: blank is missing, not zero." };
  const number = readNumber(typed, options.decimalMark ?? "either");
  if (!number.ok) {
    const example = number.code === "not-a-number" ? ` Type for example ${examples(dimension, "12")[0]}.` : "";
    return { ok: false, code: number.code, message: `“${typed}” ${number.message}.${example}` };
  }
  const { value, rest } = number;
  const digits = rest === "" ? typed : typed.slice(0, typed.length - rest.length).trim();
  const unit = findUnit(dimension, rest);
  if (!unit) return unitFault(typed, digits, rest, dimension);
  const si = toSi(value, unit, dimension);
  const { name, least }: DimensionDefinition = DIMENSIONS[dimension];
  if (!Number.isFinite(si)) return fault("out-of-range", `“${typed}”: that is too large for a ${name}.`);
  if (least !== undefined && si < least) {
    const floor = showQuantity(fromSi(least, unit, dimension), unit.symbol, { significant: 5, trim: true });
    return fault("out-of-range", `“${typed}”: the lowest ${name} is ${floor}.`);
  }
  return {
    ok: true,
    value: si === 0 ? 0 : si,
    understood: showQuantity(value, unit.symbol, { significant: 15, trim: true }),
    unit: unit.symbol,
  };
}

function fault(code: QuantityFault, message: string): QuantityReading {
  return { ok: false, code, message };
}

/** One minus, one micro, one ångström, ordinary single blanks. */
function plain(text: string): string {
  return text
    .replace(/[\u2212\u2013\uFE63\uFF0D]/g, "-")
    .replace(/\u03BC/g, "µ")
    .replace(/\u212B|A\u030A/g, "Å")
    .replace(/[\s\u00A0\u2007\u2009\u202F]+/g, " ")
    .trim();
}

function examples(dimension: Dimension, digits: string): string[] {
  return DIMENSIONS[dimension].units.slice(0, 2).map(({ symbol }) => `${digits} ${symbol}`.trim());
}

function unitFault(typed: string, digits: string, rest: string, dimension: Dimension): QuantityReading {
  const { name, use, units }: DimensionDefinition = DIMENSIONS[dimension];
  if (rest === "") return fault("missing-unit", `${digits} what? Type ${examples(dimension, digits).join(" or ")}.`);
  const otherCase = units.find((u) => spellingsOf(u).some((s) => s.toLowerCase() === rest.toLowerCase()));
  if (otherCase && !spellingsOf(otherCase).includes(rest)) {
    const meaning = MISTAKEN[rest] ?? "is not a unit with these capitals";
    return fault("case", `“${typed}”: ${rest} ${meaning}; did you mean ${otherCase.symbol}?`);
  }
  const elsewhere = (Object.keys(DIMENSIONS) as Dimension[]).find((other) => findUnit(other, rest));
  if (elsewhere) {
    const what = DIMENSIONS[elsewhere].name;
    return fault("other-dimension", `“${typed}”: ${rest} is a unit of ${what}, not of ${name}. Use ${use}.`);
  }
  return fault("unknown-unit", `“${typed}”: ${rest} is not a unit of ${name} used here. Use ${use}.`);
}

function spellingsOf({ symbol, spellings }: UnitDefinition): string[] {
  return [symbol, ...spellings].filter((spelling) => spelling !== "");
}

/** Units that exist but are a slip of the shift key here. */
const MISTAKEN: Record<string, string | undefined> = {
  mPa: "is millipascal",
  Mm: "is megametre",
  "MN/m": "is meganewton per metre",
  S: "is siemens",
};
