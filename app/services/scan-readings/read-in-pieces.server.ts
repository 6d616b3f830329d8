import { scanReader, type ScanRead } from "#app/lib/scan-reading/scan-reader.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { Tell } from "../jobs/progress.server.ts";
import { scanFilePiece } from "../scan-files.server.ts";

/** Bytes between two looks at whether to go on. */
const PIECE = 1024 * 1024;

/**
 * Reads a stored file. The text of a large one never exists all together: its bytes come from the database piece by piece.
 * @param tell is told how many bytes are read
 * @throws ScanFileError when it cannot be read, 404 for a file that is not there or of another program
 */
export async function readInPieces(
  scope: ActorScope,
  { id, name, size }: { id: string; name: string; size: number },
  profile: ImportProfile,
  tell: Tell,
): Promise<ScanRead> {
  const reader = scanReader(name, profile);
  for (let at = 0; at < size; at += PIECE) {
    if (!reader.push(await scanFilePiece(scope, id, at, PIECE))) break;
    await tell(Math.min(at + PIECE, size));
  }
  return reader.end();
}
