/**
 * A name as it may stand in a header or within a sentence: no line's end, which would begin another header, no other control
 * character, and none that turns the direction of what follows it.
 */
export function oneLine(text: string): string {
  return text
    .replace(/[\u200e\u200f\u202a-\u202e\u2066-\u2069]/gu, "")
    .replace(/[\p{Cc}\p{Zl}\p{Zp}\s]+/gu, " ")
    .trim();
}

/** What somebody wrote, over several lines: line ends stay, other control characters go. */
export function severalLines(text: string): string {
  return text
    .split(/\r\n|[\r\n\u2028\u2029]/u)
    .map(oneLine)
    .join("\n")
    .replace(/\n{3,}/g, "\n\n")
    .trim();
}
