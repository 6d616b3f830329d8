import { excerpt } from "#app/lib/excerpt.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { ScanReadingResult } from "#app/schemas/scan-reading.ts";
import type { FileFormat, FileReading, SkippedRow } from "#app/schemas/scan-result.ts";
import type { FileProfile, ProfileFile } from "./profile-rows.ts";
import { LENGTH_UNITS, type Reading } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import { readScanFile, type ScanRead } from "./scan-reader.ts";

/** The only profile of a file: all its points for the engine, and how the file was understood. */
export interface ReadProfile {
  points: { x: Float64Array; z: Float64Array };
  reading: FileReading;
}

const LONGEST_HEAD = 80;

/**
 * Reads a file that holds one profile, position and height, in stated units and with a stated decimal mark. Heads tell the two
 * columns; without heads, and where their numbers do not tell them either, they are the first two.
 * @throws ScanFileError with a sentence that says what is wrong, where, and what to do
 */
export function readOneProfile(bytes: Uint8Array, fileName: string, stated: FileFormat): ReadProfile {
  const profile = statedProfile(stated);
  const read = readScanFile(bytes, fileName, profile);
  const unheaded = unheadedProfile(read, profile);
  return onlyProfile(unheaded ? readScanFile(bytes, fileName, unheaded) : read, fileName);
}

/** What is stated, as an import profile. */
export const statedProfile = ({ positionUnit, heightUnit, decimalMark }: FileFormat): ImportProfile => ({
  decimalMark,
  units: { position: positionUnit, height: heightUnit },
});

/** The profile to read a file by again of which nothing tells the columns; null when they are told. */
export function unheadedProfile(read: ScanRead, profile: ImportProfile): ImportProfile | null {
  if (!isOnlyUnheaded(read)) return null;
  const columns: ImportProfile["columns"] = [
    { index: 0, role: "position" },
    { index: 1, role: "height" },
  ];
  return { ...profile, columns };
}

/**
 * The only profile of a file that was read.
 * @throws ScanFileError when it holds none or several, or leaves open what they are
 */
export function onlyProfile(read: ScanRead, fileName: string): ReadProfile {
  const name = excerpt(fileName, LONGEST_HEAD);
  const { kind, ambiguities } = read.reading;
  if (kind !== "profiles")
    throw new ScanFileError(`${name} is a ${kind}, not a profile. Choose the scan, position and height in a row.`);
  if (read.outcome === "question" || read.content.kind !== "profiles") {
    const open = ambiguities.find(({ blocks }) => blocks);
    throw new ScanFileError(`${name}: ${open?.sentence ?? "its columns are not known."}`);
  }
  const [only, ...others] = read.content.profiles;
  if (!only || others.length > 0)
    throw new ScanFileError(
      `${name} holds ${read.content.profiles.length} profiles: ${read.content.profiles.map((each) => `“${excerpt(each.name, 30)}”`).join(", ")}. Export the one that is meant to a file of its own.`,
    );
  return wholeProfile(read.reading, read.content, only);
}

/**
 * One of the profiles of a file that was read, with all its points.
 * @returns null when the file has no such profile
 */
export function readProfile(read: ScanRead, which: number): ReadProfile | null {
  if (read.outcome === "question" || read.content.kind !== "profiles") return null;
  const profile = read.content.profiles[which];
  return profile ? wholeProfile(read.reading, read.content, profile) : null;
}

const wholeProfile = (reading: Reading, content: ProfileFile, profile: FileProfile): ReadProfile => ({
  points: { x: profile.x, z: profile.z },
  reading: fileReading(reading, content, about(profile, profile.x.length)),
});

/**
 * One of the profiles that a stored reading holds, as the file was read then. Where points were averaged, the ends are those of the
 * averages.
 * @returns null when the reading has no such profile
 */
export function storedProfile({ reading, content }: ScanReadingResult, which: number): ReadProfile | null {
  const profile = content.kind === "profiles" ? content.profiles[which] : undefined;
  if (content.kind !== "profiles" || !profile) return null;
  const [x, z] = [Float64Array.from(profile.x), Float64Array.from(profile.z)];
  const [from, to] = x.reduce(
    ([low = 0, high = 0], at) => [Math.min(low, at), Math.max(high, at)],
    [Infinity, -Infinity],
  );
  const read = about({ ...profile, x, from: from ?? 0, to: to ?? 0 }, profile.points);
  return { points: { x, z }, reading: fileReading(reading, content, read) };
}

/** Nothing but the columns is open, and no head says anything of them. */
function isOnlyUnheaded({ outcome, reading }: ScanRead): boolean {
  const open = reading.ambiguities.filter(({ blocks }) => blocks);
  return (
    outcome === "question" &&
    open.every(({ what }) => what === "columns") &&
    reading.columns.every(({ role }) => role === null)
  );
}

/** A profile of a file: its columns, its ends in m, its points in the file and those that a fit is given. */
interface About extends Pick<FileProfile, "position" | "height" | "from" | "to"> {
  used: number;
  fitted: number;
}

const about = (
  { position, height, from, to, x }: Pick<FileProfile, "position" | "height" | "from" | "to" | "x">,
  used: number,
): About => ({ position, height, from, to, used, fitted: x.length });

function fileReading(
  reading: Reading,
  content: Pick<ProfileFile, "rows" | "faulty" | "faults">,
  { position, height, from, to, used, fitted }: About,
): FileReading {
  const unitAt = (column: number) => LENGTH_UNITS.find((unit) => unit === reading.columns[column]?.unit) ?? "m";
  const heads = [position, height].map((column) => reading.columns[column]?.heading ?? "");
  const skipped = content.faults
    .flatMap(({ places }) => places)
    .map(({ row, column, text }): SkippedRow => ({ row, column: column === height ? "height" : "position", text }))
    .sort((one, other) => one.row - other.row);
  return {
    rows: content.rows,
    used,
    columns: reading.columns.length,
    readColumns: [position, height],
    heading: heads.every((head) => head === "") ? null : excerpt(heads.join(", "), LONGEST_HEAD),
    delimiter: reading.delimiter,
    from,
    to,
    skipped,
    skippedInAll: content.faulty,
    ...(fitted < used ? { averagedTo: fitted } : {}),
    // A file without any mark reads the same under either.
    format: {
      positionUnit: unitAt(position),
      heightUnit: unitAt(height),
      decimalMark: reading.decimalMark ?? "point",
    },
  };
}
