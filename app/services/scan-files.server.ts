import { createHash, randomUUID } from "node:crypto";
import { UniqueConstraintViolationException, type EntityManager } from "@mikro-orm/postgresql";
import { ScanFile } from "#app/db/entities/scan-file.ts";
import type { StoredFile } from "#app/schemas/job.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";

/** SHA-256, hex. */
export const sha256 = (content: string): string => createHash("sha256").update(content).digest("hex");

/** SHA-256 of a file, hex, worked out beside the thread that answers requests: 48 MB would hold it up for a tenth of a second. */
export async function fileHash(bytes: Uint8Array<ArrayBuffer>): Promise<string> {
  return Buffer.from(await crypto.subtle.digest("SHA-256", bytes)).toString("hex");
}

/** The same bytes are kept once in a program, under the name they first came with. */
export async function keepScanFile(
  em: EntityManager,
  scope: ActorScope,
  programId: string,
  file: UploadedFile,
): Promise<ScanFile> {
  const hash = await fileHash(file.bytes);
  const known = await em.findOne(ScanFile, { program: programId, hash });
  if (known) return known;
  const kept = em.create(ScanFile, {
    id: randomUUID(),
    program: programId,
    name: file.name,
    hash,
    size: file.bytes.length,
    bytes: Buffer.from(file.bytes.buffer, file.bytes.byteOffset, file.bytes.byteLength),
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
  await em.flush();
  return kept;
}

/** Keeps a file in a transaction of its own. */
export async function keepScanFileAlone(scope: ActorScope, programId: string, file: UploadedFile): Promise<StoredFile> {
  const keep = () =>
    inScope(scope, async (em): Promise<StoredFile> => {
      const { id, name, size } = await keepScanFile(em, scope, programId, file);
      return { id, name, size };
    });
  try {
    return await keep();
  } catch (error) {
    // Somebody stored the same file at the same moment: the second time finds it.
    if (error instanceof UniqueConstraintViolationException) return keep();
    throw error;
  }
}

/** So many bytes of a file from a place on, fewer at its end. */
export type Pieces = (from: number, length: number) => Promise<Uint8Array>;

/**
 * A stored file piece by piece, within a transaction that is open already.
 * @throws 404 for a file that is not there or of another program
 */
export const piecesWithin =
  (em: EntityManager, id: string): Pieces =>
  async (from, length) => {
    const [row] = await em.execute<{ piece: Uint8Array }[]>(
      "select substring(bytes from ? for ?) as piece from scan_file where id = ?",
      [from + 1, length, id],
    );
    if (!row) throw notFound("scan file");
    return row.piece;
  };

/** The same, each piece in a transaction of its own, so that none stays open while a large file is read. */
export const piecesOf =
  (scope: ActorScope, id: string): Pieces =>
  (from, length) =>
    inScope(scope, (em) => piecesWithin(em, id)(from, length));
