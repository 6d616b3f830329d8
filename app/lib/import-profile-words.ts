import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { DELIMITER_WORDS } from "./scan-reading/delimiter-words.ts";
import { measuredWords, underneathWords } from "./wafer-figures.ts";

/** What an import profile says of an instrument's files, part by part; what it leaves to the files is not named. */
export function importProfileWords(profile: ImportProfile): string[] {
  const { kind, delimiter, decimalMark, thousands, headerRow, firstRow, columns, units, measured, underneath } =
    profile;
  const columnWords = (columns ?? []).map(({ index, heading, role, unit }) => {
    const which = heading === undefined ? `column ${(index ?? 0) + 1}` : `“${heading}”`;
    return `${which}: ${role}${unit ? `, ${unit}` : ""}`;
  });
  const unitWords = Object.entries(units ?? {}).map(([role, unit]) => `${role} in ${unit}`);
  return [
    ...(kind ? [kind] : []),
    ...(delimiter ? [`split at ${DELIMITER_WORDS[delimiter] ?? `“${delimiter}”`}`] : []),
    ...(decimalMark ? [`decimal ${decimalMark}`] : []),
    ...(thousands && thousands !== "none" ? [`thousands grouped by a ${thousands}`] : []),
    ...(headerRow ? [`heads in row ${headerRow}`] : []),
    ...(firstRow ? [`data from row ${firstRow}`] : []),
    ...columnWords,
    ...unitWords,
    ...(measured ? [measuredWords(measured)] : []),
    ...(underneath ? [underneathWords(underneath)] : []),
  ];
}
