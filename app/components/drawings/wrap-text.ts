import { textWidth } from "./text-width.ts";

/**
 * Breaks a text after spaces and hyphens into lines of at most `width` px (SVG does not wrap). A longer word keeps its
 * own line; a no-break space never breaks. Text that needs more than `maxLines` stays whole on the last line.
 */
export function wrapText(text: string, width: number, size: number, maxLines: number, semibold = false): string[] {
  const lines: string[] = [];
  let line = "";
  for (const piece of text.split(/(?<=[ -])/)) {
    const longer = line + piece;
    if (line !== "" && lines.length < maxLines - 1 && textWidth(longer.trimEnd(), size, semibold) > width) {
      lines.push(line.trimEnd());
      line = piece;
    } else {
      line = longer;
    }
  }
  return [...lines, line.trimEnd()];
}
