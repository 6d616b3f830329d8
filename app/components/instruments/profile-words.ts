import { DELIMITER_WORDS } from "#app/lib/scan-reading/delimiter-words.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";

/** What is kept of how an instrument writes its files, in a sentence or two. */
export function profileWords({ delimiter, decimalMark, columns, units }: ImportProfile): string {
  const marks = [
    delimiter !== undefined && `split at ${DELIMITER_WORDS[delimiter] ?? `“${delimiter}”`}`,
    decimalMark !== undefined && `decimal ${decimalMark}`,
    ...(columns ?? []).map(
      ({ heading, index, role, unit }) =>
        `${role} in ${heading === undefined ? `column ${(index ?? 0) + 1}` : `“${heading}”`}${unit === undefined ? "" : `, ${unit}`}`,
    ),
    ...Object.entries(units ?? {}).map(([role, unit]) => `${role} in ${unit}`),
  ].filter((part) => part !== false);
  if (marks.length === 0) return "Nothing is kept of how it writes its files: each file says it by itself.";
  const text = marks.join("; ");
  return `Its files are read so: ${text}. What is not named here, each file says by itself.`;
}
