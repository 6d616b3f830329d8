import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import { readScanFile, type FileContent, type ScanRead } from "#app/lib/scan-reading/scan-reader.ts";
import type { Ambiguity, Reading } from "#app/lib/scan-reading/reading.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";

type Kind = FileContent["kind"];

function contentOf<K extends Kind>(read: ScanRead, kind: K): { reading: Reading; content: FileContent & { kind: K } } {
  if (read.outcome !== "read")
    throw new Error(`it was asked: ${read.reading.ambiguities.map(({ sentence }) => sentence).join(" ")}`);
  const { reading, content } = read;
  if (!isKind(content, kind)) throw new Error(`it was read as ${content.kind}`);
  return { reading, content };
}

const isKind = <K extends Kind>(content: FileContent, kind: K): content is FileContent & { kind: K } =>
  content.kind === kind;

/** What was read of a file of profiles; fails when it is another kind or was asked about. */
export const profilesOf = (read: ScanRead) => contentOf(read, "profiles");

const bytesOf = (content: string | Uint8Array) =>
  typeof content === "string" ? new TextEncoder().encode(content) : content;

/** A table of a stated kind as it was read. */
export const tableOf = <K extends Kind>(kind: K, text: string, profile: ImportProfile = {}) =>
  contentOf(readScanFile(bytesOf(text), "lot-7.csv", profile), kind);

/** What a file leaves open so that nothing of it is read. */
export function questionsOf(content: string, profile: ImportProfile = {}): Ambiguity[] {
  const read = readScanFile(bytesOf(content), "M-0388.csv", profile);
  if (read.outcome === "read") throw new Error("the file was read");
  return read.reading.ambiguities.filter(({ blocks }) => blocks);
}

/** The sentence with which a file is turned down. */
export function refusalOf(content: string | Uint8Array, profile: ImportProfile = {}): string {
  try {
    const read = readScanFile(bytesOf(content), "M-0388.csv", profile);
    throw new Error(`not refused: ${read.outcome}`);
  } catch (error) {
    if (error instanceof ScanFileError) return error.message;
    throw error;
  }
}
