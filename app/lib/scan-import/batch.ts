import { LARGEST_FILE, tooLargeSentence } from "#app/lib/scan-file.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { guessFromName, type ScanOf } from "./name-guess.ts";
import { unreadable, type FileSaid, type Told } from "./told.ts";

/** Files that one batch may have. */
export const MOST_FILES = 200;

/** A file of the batch, with all that is said of it. */
export interface BatchFile {
  key: string;
  file: File;
  profile: ImportProfile;
  /** counts the profiles that it was read by */
  revision: number;
  of: ScanOf;
  /** of each profile of a file that holds several, where a person has typed it, by its place */
  azimuths: Readonly<Record<number, string>>;
  /** id of the import profile of its instrument, where one was chosen or kept */
  instrument: string | null;
  /** bytes that are read; null when it is not being read */
  done: number | null;
  told: Told | null;
}

export type BatchChange =
  | { kind: "add"; files: readonly File[] }
  | { kind: "remove"; keys: readonly string[] }
  | { kind: "profile"; key: string; profile: ImportProfile }
  | { kind: "profile of all"; from: string }
  | { kind: "instrument"; key: string; instrument: string | null; profile?: ImportProfile }
  | { kind: "azimuth"; key: string; profile: number; azimuth: string }
  | { kind: "of"; key: string; of: Partial<ScanOf> }
  | { kind: "said"; said: FileSaid };

export interface Batch {
  files: BatchFile[];
  /** number of the next file, for keys */
  next: number;
  /** files of the last choice that were in the batch already, or beyond its limit */
  passedOver: { twice: number; tooMany: number };
}

export const EMPTY_BATCH: Batch = { files: [], next: 1, passedOver: { twice: 0, tooMany: 0 } };

/** The batch after a change. A file whose profile has changed is read anew: its revision is one more. */
export function changedBatch(batch: Batch, change: BatchChange): Batch {
  const each = (change: (file: BatchFile) => BatchFile): Batch => ({ ...batch, files: batch.files.map(change) });
  switch (change.kind) {
    case "add":
      return added(batch, change.files);
    case "remove":
      return { ...batch, files: batch.files.filter(({ key }) => !change.keys.includes(key)) };
    case "profile":
      return each((file) => (file.key === change.key ? readAnew(file, change.profile) : file));
    case "profile of all":
      return profileOfAll(batch, change.from);
    case "instrument":
      return each((file) => (file.key === change.key ? withInstrument(file, change) : file));
    case "azimuth":
      return each((file) =>
        file.key === change.key ? { ...file, azimuths: { ...file.azimuths, [change.profile]: change.azimuth } } : file,
      );
    case "of":
      return each((file) => (file.key === change.key ? { ...file, of: { ...file.of, ...change.of } } : file));
    case "said":
      return each((file) => heard(file, change.said));
  }
}

function added(batch: Batch, chosen: readonly File[]): Batch {
  const files = [...batch.files];
  const passedOver = { twice: 0, tooMany: 0 };
  let { next } = batch;
  for (const file of chosen) {
    if (files.some(({ file: known }) => isSame(known, file))) passedOver.twice += 1;
    else if (files.length >= MOST_FILES) passedOver.tooMany += 1;
    else {
      const tooLarge = file.size > LARGEST_FILE;
      files.push({
        key: `file-${next}`,
        file,
        profile: {},
        revision: 1,
        of: guessFromName(file.name),
        azimuths: {},
        instrument: null,
        done: tooLarge ? null : 0,
        told: tooLarge ? unreadable(tooLargeSentence(file.name, file.size)) : null,
      });
      next += 1;
    }
  }
  return { files, next, passedOver };
}

const isSame = (one: File, other: File) =>
  one.name === other.name && one.size === other.size && one.lastModified === other.lastModified;

function readAnew(file: BatchFile, profile: ImportProfile): BatchFile {
  if (file.file.size > LARGEST_FILE) return file;
  return { ...file, profile, revision: file.revision + 1, done: 0 };
}

/** What was answered to one file, and its instrument, for all the others too; what they have of their own stays. */
function profileOfAll(batch: Batch, from: string): Batch {
  const source = batch.files.find(({ key }) => key === from);
  if (!source) return batch;
  const files = batch.files.map((file) =>
    file.key === from
      ? file
      : {
          ...readAnew(file, { ...file.profile, ...source.profile }),
          instrument: source.instrument ?? file.instrument,
        },
  );
  return { ...batch, files };
}

/** The instrument of a file; its profile is read by at once where one comes with it. */
function withInstrument(
  file: BatchFile,
  { instrument, profile }: Extract<BatchChange, { kind: "instrument" }>,
): BatchFile {
  return { ...(profile ? readAnew(file, profile) : file), instrument };
}

/** A refusal leaves the form that was told before, so that what was chosen can be chosen otherwise. */
function heard(file: BatchFile, said: FileSaid): BatchFile {
  if (said.key !== file.key || said.revision !== file.revision) return file;
  if (said.kind === "progress") return { ...file, done: said.done };
  const layout = said.told.layout ?? file.told?.layout ?? null;
  return { ...file, done: null, told: { ...said.told, layout } };
}
