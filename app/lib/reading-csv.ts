import { csvOf, type CsvMark } from "./csv.ts";
import type { ReadProfileFigures } from "#app/schemas/scan-reading.ts";

/** A profile with the points of its file, where it is known that there were more than are kept. */
export type KeptProfile = Pick<ReadProfileFigures, "along" | "x" | "z"> & Partial<Pick<ReadProfileFigures, "points">>;

/**
 * What is kept of profiles as a file that is read back without a question and without a change, to the last bit: positions and heights
 * in metres, a pair of columns each, blank where one profile is longer than the other. A remark above says of which the means are kept.
 * Nothing of the file's own words goes in, so no cell is a formula.
 */
export function profilesCsv(profiles: KeptProfile[], mark?: CsvMark): string {
  const heads = profiles.flatMap(({ along }, n) => [
    `${along === "radius" ? "Radius" : "Position"} ${n + 1} [m]`,
    `Height ${n + 1} [m]`,
  ]);
  const remarks = profiles.flatMap(({ x, points = 0 }, n) =>
    x.length < points
      ? [`# Profile ${n + 1}: ${x.length} means of equal stretches; the file as it came has all ${points} points`]
      : [],
  );
  const rows = Math.max(0, ...profiles.map(({ x }) => x.length));
  const lines = Array.from({ length: rows }, (_, row) => profiles.flatMap(({ x, z }) => [x[row] ?? "", z[row] ?? ""]));
  return `${remarks.map((line) => `${line}\r\n`).join("")}${csvOf([heads, ...lines], mark)}`;
}
