import { excerpt } from "#app/lib/excerpt.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { blankSentence, emptySentence, textDecoding } from "./decoding.ts";
import { layoutOf, type Layout } from "./layout.ts";
import { ProfileRows, type ProfileFile } from "./profile-rows.ts";
import type { Reading } from "./reading.ts";
import { reducedStressOf, type ReducedStresses } from "./reduced-stress.ts";
import { ScanFileError } from "./refusal.ts";
import { endlessSentence, LONGEST_LINE, rowSource, type RowSource } from "./row-source.ts";
import { summaryOf, type Summary } from "./summary.ts";
import { TableRows } from "./table-rows.ts";
import { thicknessMapOf, type ThicknessMap } from "./thickness-map.ts";

/** Characters from which the layout is told. */
const SAMPLE = 128 * 1024;
/** Bytes that are decoded at once, so that text and cells of a large file never exist all together. */
const PIECE = 64 * 1024;

export type FileContent =
  | ({ kind: "profiles" } & ProfileFile)
  | ({ kind: "summary" } & Summary)
  | ({ kind: "thickness map" } & ThicknessMap)
  | ({ kind: "reduced stress" } & ReducedStresses);

/** What a file says, or what a person has to answer before it says anything. */
export type ScanRead = Layout & ({ outcome: "read"; content: FileContent } | { outcome: "question" });

export interface ScanReader {
  /**
   * The next bytes of the file.
   * @returns false when no more are needed: a person has to answer first
   */
  push(bytes: Uint8Array): boolean;
  end(): ScanRead;
  /** how the file was understood so far, also where its content is refused; null while that is not told */
  layout(): Layout | null;
}

/**
 * Reads a file of a profilometer or a wafer gauge as it comes, piece by piece, in memory that does not grow with its text.
 * @param fileName for sentences
 * @param profile what a person has answered; it goes before what is told by the file
 * @throws ScanFileError from `push` and `end`, with a sentence that says what is wrong, where, and what to do
 */
export function scanReader(fileName: string, profile: ImportProfile = {}): ScanReader {
  const name = excerpt(fileName, 80);
  const decoding = textDecoding(name, profile.encoding);
  let bytesSeen = 0;
  let sample = "";
  let running: { layout: Layout; source: RowSource; finish: () => FileContent } | null = null;
  let asked: Layout | null = null;

  const begin = (text: string) => {
    refuseNoText(name, text);
    const layout = layoutOf(name, wholeLines(text), decoding.encoding(), profile);
    if (layout.reading.ambiguities.some(({ blocks }) => blocks)) {
      asked = layout;
      return;
    }
    const { take, finish } = contentOf(name, layout.reading, profile);
    running = { layout, source: rowSource(name, layout.reading.delimiter, take), finish };
    running.source.push(text);
  };

  const takeText = (text: string) => {
    if (running) running.source.push(text);
    else {
      sample += text;
      if (sample.length > LONGEST_LINE && !/[\r\n]/.test(sample.slice(0, LONGEST_LINE)))
        throw new ScanFileError(endlessSentence(name, 1));
      if (sample.length < SAMPLE || !/[\r\n]/.test(sample)) return;
      begin(sample);
      sample = "";
    }
  };

  return {
    push(bytes) {
      bytesSeen += bytes.length;
      for (let at = 0; at < bytes.length && asked === null; at += PIECE)
        takeText(decoding.push(bytes.subarray(at, at + PIECE)));
      return asked === null;
    },
    layout: () => running?.layout ?? asked,
    end() {
      if (asked === null) {
        if (bytesSeen === 0) throw new ScanFileError(emptySentence(name));
        takeText(decoding.end());
        if (running === null && asked === null) {
          if (sample.trim() === "") throw new ScanFileError(blankSentence(name));
          begin(sample);
        }
      }
      const question: Layout | null = asked;
      if (question !== null) return { outcome: "question", ...question };
      if (running === null) throw new Error("a file without question is read");
      const { layout, source, finish } = running;
      source.end();
      const content = finish();
      return { outcome: "read", ...layout, reading: { ...layout.reading, encoding: decoding.encoding() }, content };
    },
  };
}

/** Reads a file whose bytes are at hand. */
export function readScanFile(bytes: Uint8Array, fileName: string, profile: ImportProfile = {}): ScanRead {
  const reader = scanReader(fileName, profile);
  reader.push(bytes);
  return reader.end();
}

function contentOf(
  name: string,
  reading: Reading,
  profile: ImportProfile,
): { take: (rows: string[][], first: number) => void; finish: () => FileContent } {
  const { kind } = reading;
  if (kind === "profiles") {
    const rows = new ProfileRows(name, reading);
    return { take: (more, first) => rows.take(more, first), finish: () => ({ kind, ...rows.end() }) };
  }
  const table = new TableRows(name, reading);
  const take = (more: string[][], first: number) => table.take(more, first);
  switch (kind) {
    case "summary":
      return { take, finish: () => ({ kind, ...summaryOf(table, profile.measured) }) };
    case "thickness map":
      return { take, finish: () => ({ kind, ...thicknessMapOf(table, profile.underneath) }) };
    case "reduced stress":
      return { take, finish: () => ({ kind, ...reducedStressOf(table) }) };
  }
}

/** Control characters that no text of an instrument holds. */
const NO_TEXT = /[\u0001-\u0008\u000E-\u001A\u001C-\u001F]/g;

function refuseNoText(name: string, text: string): void {
  const strange = text.slice(0, SAMPLE).match(NO_TEXT)?.length ?? 0;
  if (strange > 0.01 * Math.min(text.length, SAMPLE))
    throw new ScanFileError(`${name} is not a text file. Export it as CSV or text.`);
  const start = text.trimStart().slice(0, 15).toLowerCase();
  if (start.startsWith("<!doctype html") || start.startsWith("<html"))
    throw new ScanFileError(`${name} is a web page, not a table. Export it as CSV or text.`);
}

/** The text up to its last line end, lines ended by a line feed: what a longer file goes on with is no part of a sample. */
function wholeLines(text: string): string {
  const unified = text.replace(/\r\n?/g, "\n");
  const last = unified.lastIndexOf("\n");
  return text.length < SAMPLE || last < 0 ? unified : unified.slice(0, last + 1);
}
