/** Which mark separates the decimals. `either` reads both and refuses what could be either. */
export type DecimalMark = "point" | "comma" | "either";

export type NumberReading =
  | { ok: true; value: number; rest: string }
  | { ok: false; code: "not-a-number" | "ambiguous" | "decimal-mark"; message: string };

/**
 * Sign, digits with marks and blanks between them, power of ten, and what follows. A blank before '1/' ends the number, because
 * the unit begins there: 5 1/m.
 */
const LEADING_NUMBER = /^([+-]?) ?([.,]?\d(?:\d|[.,](?=\d)| (?=\d)(?!1\/))*[.,]?)(?:[eE]([+-]?\d+))?(.*)$/;

/** Groups of three set apart by one mark: 1 200, 1,234,567. */
const grouped = (mark: string) => new RegExp(`^\\d{1,3}(?:\\${mark}\\d{3})+$`);

/**
 * Reads a number at the start of `text`, whose characters have been made plain (hyphen for minus, ordinary blanks), and returns
 * what follows it. Thousands may be set apart by blanks, or by the mark that is not the decimal mark. Under `either` a point is
 * a decimal mark, a comma too unless it could just as well set thousands apart, as in 1,234.
 */
export function readNumber(text: string, mark: DecimalMark): NumberReading {
  const match = LEADING_NUMBER.exec(text);
  if (!match) return { ok: false, code: "not-a-number", message: "is not a number" };
  const [, sign = "", body = "", power = "0", rest = ""] = match;
  const digits = plainDigits(body, mark);
  if (!digits.ok) return digits;
  const value = Number(`${sign}${digits.text}e${power}`);
  if (!Number.isFinite(value)) {
    return { ok: false, code: "not-a-number", message: "is too large a number" };
  }
  return { ok: true, value: value === 0 ? 0 : value, rest: rest.trim() };
}

type Digits = { ok: true; text: string } | Extract<NumberReading, { ok: false }>;

const misplaced: Digits = {
  ok: false,
  code: "not-a-number",
  message: "is not a number: a blank, point or comma stands where none can",
};

/** The digits with a point as decimal mark and nothing else. */
function plainDigits(body: string, mark: DecimalMark): Digits {
  const [whole = "", ...parts] = body.split(/[.,](?=[^.,]*$)/);
  const last = parts[0];
  if (last === undefined) return grouping(whole, " ", "");
  const used = body.charAt(whole.length);
  const other = used === "," ? "." : ",";
  if (last.includes(" ")) return misplaced;
  if (whole.includes(used)) {
    // 1,234,567: the same mark twice can only set thousands apart.
    if (mark === (used === "," ? "comma" : "point")) return decimalMarkIs(mark);
    return grouping(`${whole}${used}${last}`, used, "");
  }
  const decimal = mark === "either" || mark === (used === "," ? "comma" : "point");
  if (!decimal) {
    const asThousands = grouping(body, used, "");
    return asThousands.ok ? asThousands : decimalMarkIs(mark);
  }
  if (mark === "either" && used === "," && grouped(",").test(body) && !body.startsWith("0")) {
    return {
      ok: false,
      code: "ambiguous",
      message: `can be read as ${body.replace(",", "")} or as ${body.replace(",", ".")}; type one of these`,
    };
  }
  return whole.includes(other) ? grouping(whole, other, last) : grouping(whole, " ", last);
}

function grouping(whole: string, separator: string, decimals: string): Digits {
  if (/^\d*$/.test(whole))
    return { ok: true, text: `${whole === "" ? "0" : whole}.${decimals === "" ? "0" : decimals}` };
  if (!grouped(separator).test(whole)) return misplaced;
  return { ok: true, text: `${whole.split(separator).join("")}.${decimals === "" ? "0" : decimals}` };
}

function decimalMarkIs(mark: DecimalMark): Digits {
  const name = mark === "comma" ? "comma" : "point";
  return { ok: false, code: "decimal-mark", message: `does not fit: the decimal mark here is a ${name}` };
}
