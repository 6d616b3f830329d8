import { PAPER_WIDTHS } from "./paper-widths.ts";

const MM_PER_POINT = 25.4 / 72;

const widths = new Map(
  PAPER_WIDTHS.flatMap(([characters, ...both]) => [...characters].map((each) => [each, both] as const)),
);

/** What a character that is not listed counts as, thousandths: a wide capital. */
const UNLISTED = 760;

/** Width of a text, mm, at a size, pt. */
export function widthOf(text: string, size: number, bold = false): number {
  let thousandths = 0;
  for (const character of text) thousandths += widths.get(character)?.[bold ? 1 : 0] ?? UNLISTED;
  return (thousandths / 1000) * size * MM_PER_POINT;
}

/** Lines are planned for a little less than their width, since browser and PDF place glyphs by rules of their own. */
const SHARE = 0.992;

/**
 * How many lines a text takes in a width, mm, at a size, pt. A browser breaks after hyphens too, a PDF only at spaces; the larger
 * count is taken.
 */
export function linesOf(text: string, width: number, size: number, bold = false): number {
  const asks = { width: width * SHARE, size, bold };
  return Math.max(broken(text.split(/(?<= )/), asks), broken(text.split(/(?<= |-)/), asks));
}

function broken(
  pieces: readonly string[],
  { width, size, bold }: { width: number; size: number; bold: boolean },
): number {
  let lines = 1;
  let line = "";
  for (const piece of pieces) {
    if (line !== "" && widthOf((line + piece).trimEnd(), size, bold) > width) {
      lines += 1;
      line = piece;
    } else {
      line += piece;
    }
  }
  return lines;
}

/** Lines of several texts under one another. */
export function linesOfAll(texts: readonly string[], width: number, size: number, bold = false): number {
  return texts.reduce((sum, text) => sum + linesOf(text, width, size, bold), 0);
}
