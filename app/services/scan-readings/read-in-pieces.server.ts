import { setImmediate as nextTurn } from "node:timers/promises";
import { scanReader, type ScanRead } from "#app/lib/scan-reading/scan-reader.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { Tell } from "../jobs/progress.server.ts";
import type { Pieces } from "../scan-files.server.ts";

/** Bytes between two looks at whether to go on. */
const PIECE = 1024 * 1024;

/** Whoever waits for no figure lets others have their turn all the same. */
const untold: Tell = () => nextTurn();

/**
 * Reads a stored file. The text of a large one never exists all together: its bytes come from the database piece by piece.
 * @param tell is told how many bytes are read
 * @throws ScanFileError when it cannot be read, 404 for a file that is not there or of another program
 */
export async function readInPieces(
  pieces: Pieces,
  { name, size }: { name: string; size: number },
  profile: ImportProfile,
  tell: Tell = untold,
): Promise<ScanRead> {
  const reader = scanReader(name, profile);
  for (let at = 0; at < size; at += PIECE) {
    if (!reader.push(await pieces(at, PIECE))) break;
    await tell(Math.min(at + PIECE, size));
  }
  return reader.end();
}
