import type { BatchFile } from "#app/lib/scan-import/batch.ts";
import { guessFromName, type ScanOf } from "#app/lib/scan-import/name-guess.ts";
import { readTold } from "#app/lib/scan-import/read-told.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";

/** The bytes in pieces, as a browser gives them. */
async function* inPieces(bytes: Uint8Array, size = 700) {
  for (let at = 0; at < bytes.length; at += size) yield Promise.resolve(bytes.subarray(at, at + size));
}

export const toldOf = (text: string | Uint8Array, profile: ImportProfile = {}, name = "scan.csv") =>
  readTold(inPieces(typeof text === "string" ? new TextEncoder().encode(text) : text), name, profile);

/** A file of a batch that was read. */
export async function batchFile(
  name: string,
  bytes: Uint8Array | string,
  of: Partial<ScanOf> = {},
): Promise<BatchFile> {
  return {
    key: name,
    file: new File(["x"], name),
    profile: {},
    revision: 1,
    azimuths: {},
    instrument: null,
    of: { ...guessFromName(name), ...of },
    done: null,
    told: await toldOf(bytes, {}, name),
  };
}
