import { createHash, randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { SheetDocument } from "#app/db/entities/sheet-document.ts";
import { SheetFile } from "#app/db/entities/sheet-file.ts";
import { SheetPrint } from "#app/db/entities/sheet-print.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import type { Paper } from "#app/lib/paper-size.ts";
import { markedDocument } from "#app/lib/sheet/marked-document.ts";
import { markWords, type RevisionStanding } from "#app/lib/sheet/revision-words.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { SheetFormat, SheetPages } from "#app/schemas/sheet-revision.ts";
import type { PrintForm } from "#app/schemas/sheet-view.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findRevision, type FoundRevision } from "./revision.server.ts";
import { setFile } from "./set-sheet.server.ts";

export interface AskedFile {
  format: SheetFormat;
  paper: Paper;
  /** what a guest asks for is always the page for hands alone */
  pages: SheetPages;
  /** 0 where the flow does not part by slot */
  leg: number;
}

export interface StoredSheet {
  id: string;
  bytes: Uint8Array;
  /** 'Handling-risk sheet TERN-H003 B' */
  name: string;
}

/**
 * A sheet as it was set, byte for byte; of a revision that has ended the copy with the mark across it, which is set when it is first
 * asked for and kept as well.
 * @throws 404 for what was not released to the reader, or has no such paper
 */
export async function storedSheet(
  scope: ActorScope,
  revisionId: string | undefined,
  asked: AskedFile,
): Promise<StoredSheet> {
  const found = await inScope(scope, (em) => lookUp(em, scope, revisionId, asked));
  if (found.stored) return found.stored;
  const { key, document, standing } = found;
  const bytes = await setFile(markedDocument(document, standing), asked.format, asked.paper, key.pages);
  await inScope(scope, (em) => keepMarked(em, key, bytes));
  // Somebody else may have been first: what is kept is what is handed out.
  const kept = await inScope(scope, (em) => lookUp(em, scope, revisionId, asked));
  if (!kept.stored) throw notFound("sheet");
  return kept.stored;
}

/** The same for the printer, with an entry of who took it out for which place. */
export async function printSheet(
  scope: ActorScope,
  revisionId: string | undefined,
  { place, ...asked }: PrintForm,
): Promise<StoredSheet> {
  const sheet = await storedSheet(scope, revisionId, { format: "pdf", ...asked });
  await inScope(scope, async (em) => {
    const revision = await findRevision(em, scope, revisionId, "see released sheets");
    em.create(SheetPrint, {
      id: randomUUID(),
      program: revision.program.id,
      revision: revision.id,
      file: sheet.id,
      place,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
  });
  return sheet;
}

async function lookUp(em: EntityManager, scope: ActorScope, revisionId: string | undefined, asked: AskedFile) {
  const revision = await findRevision(em, scope, revisionId, "see released sheets");
  const standing = standingOf(revision);
  if (!standing || revision.number === null || revision.number === undefined) throw notFound("sheet");
  const staff = mayInProgram(scope.actor, "see the work", revision.program.id);
  const pages: SheetPages = staff ? asked.pages : "hands";
  const key = {
    program: revision.program.id,
    revision: revision.id,
    leg: asked.leg,
    format: asked.format,
    paper: asked.paper,
    pages,
    mark: markWords(standing) ?? "",
  };
  const file = await em.findOne(SheetFile, key, { populate: ["bytes"] });
  const name = `Handling-risk sheet ${recordNumber("sheet", revision.program.slug, revision.sheet.number)} ${revisionLetters(revision.number)}`;
  if (file) return { stored: { id: file.id, bytes: new Uint8Array(await file.bytes.loadOrFail()), name } };
  const document = await em.findOne(SheetDocument, { revision: revision.id, leg: asked.leg });
  if (!document || key.mark === "") throw notFound("sheet");
  return { stored: null, key, document: document.document, standing };
}

/** How a revision stands once it was released; null before. */
export function standingOf({
  state,
  supersededBy,
}: Pick<FoundRevision, "state" | "supersededBy">): RevisionStanding | null {
  if (state === "in review" || state === "returned") return null;
  return { status: state, supersededBy: supersededBy ? revisionLetters(supersededBy) : null };
}

interface FileKey {
  program: string;
  revision: string;
  leg: number;
  format: SheetFormat;
  paper: Paper;
  pages: SheetPages;
  mark: string;
}

async function keepMarked(em: EntityManager, key: FileKey, bytes: Uint8Array): Promise<void> {
  await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`papers of ${key.revision}`]);
  if ((await em.count(SheetFile, key)) > 0) return;
  em.create(SheetFile, {
    id: randomUUID(),
    ...key,
    bytes: Buffer.from(bytes),
    sha256: createHash("sha256").update(bytes).digest("hex"),
    createdAt: new Date(),
  });
  await em.flush();
}
