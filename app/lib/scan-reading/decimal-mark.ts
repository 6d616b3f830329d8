import { excerpt } from "#app/lib/excerpt.ts";
import { markEvidence } from "./numbers.ts";
import type { Ambiguity, DecimalMark, Place, Thousands } from "./reading.ts";
import type { Split } from "./splits.ts";

const SIGNS: Record<DecimalMark, string> = { point: ".", comma: "," };

export interface Marks {
  decimalMark: DecimalMark | null;
  thousands: Thousands;
  ambiguity: Ambiguity | null;
}

type Seen = Partial<Record<"point" | "comma" | "either point" | "either comma", Place>>;

/**
 * The decimal mark and the grouping of thousands that the numbers of a sample prove. '1,234' proves nothing by itself.
 * @param stated what a person has said
 */
export function marksOf(split: Split, stated: { decimalMark?: DecimalMark; thousands?: Thousands }): Marks {
  const seen: Seen = {};
  let grouped: Thousands = "none";
  split.rows.slice(split.first).forEach((cells, n) => {
    for (const [column, text] of cells.entries()) {
      const { kind, thousands } = markEvidence(text);
      if (kind === null) continue;
      if (thousands !== "none") grouped = thousands;
      if (kind !== "none") seen[kind] ??= { row: split.first + n + 1, column, text: excerpt(text, 40) };
    }
  });
  const proved = settled(seen, split);
  const mark = stated.decimalMark ?? (typeof proved === "string" ? proved : null);
  if (mark === null && proved !== null && typeof proved === "object")
    return {
      decimalMark: null,
      thousands: grouped,
      ambiguity: {
        ...question("decimal mark", proved.sentence, ["point", "comma"]),
        ...(proved.shown === undefined ? {} : { shown: proved.shown }),
      },
    };
  const other = mark === "point" ? seen["either comma"] : seen["either point"];
  const groupSign: Thousands = mark === "point" ? "comma" : "point";
  const thousands = stated.thousands ?? (grouped !== "none" ? grouped : other && mark !== null ? groupSign : "none");
  // With the mark only stated, a comma that could be the other mark is not taken for thousands unasked.
  const unproved =
    other !== undefined &&
    stated.thousands === undefined &&
    grouped === "none" &&
    mark !== null &&
    seen[mark] === undefined;
  return {
    decimalMark: mark,
    thousands,
    ambiguity: unproved
      ? question(
          "decimal mark",
          `row ${other.row} holds “${other.text}”: ${bothWays(other.text)}. A decimal ${mark} is chosen; choose ${mark === "point" ? "comma" : "point"} if that is how it was written. If its thousands are grouped, export without grouping them, or say so.`,
          ["thousands", mark === "point" ? "comma" : "point"],
        )
      : null,
  };
}

const question = (what: Ambiguity["what"], sentence: string, choices: string[]): Ambiguity => ({
  what,
  column: null,
  choices,
  chosen: null,
  blocks: true,
  sentence,
});

/** The mark that is proved, nothing when no number has one, or why it is open. */
function settled(seen: Seen, { delimiter, quoted }: Split): DecimalMark | null | { sentence: string; shown?: string } {
  if (seen.point && seen.comma)
    return {
      sentence: `row ${seen.point.row} holds “${seen.point.text}” and row ${seen.comma.row} “${seen.comma.text}”: the file has both decimal points and decimal commas.`,
    };
  if (seen.point) return "point";
  if (seen.comma) return "comma";
  // Unquoted cells between commas hold no decimal commas, so their points are decimal.
  if (seen["either point"] && !seen["either comma"] && delimiter === "," && !quoted) return "point";
  const open = seen["either comma"] ?? seen["either point"];
  return open ? { sentence: `row ${open.row} holds “${open.text}”: ${bothWays(open.text)}.`, shown: open.text } : null;
}

function bothWays(text: string): string {
  const sign = text.includes(SIGNS.comma) ? SIGNS.comma : SIGNS.point;
  return `it may be ${text.replace(sign, ".")} or ${text.replace(sign, "")}, and no number of the file says which`;
}
