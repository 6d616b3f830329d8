import { createHash, randomBytes, randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { SheetDocument } from "#app/db/entities/sheet-document.ts";
import { SheetFile } from "#app/db/entities/sheet-file.ts";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import { sheetDocumentOf } from "#app/lib/sheet/sheet-document-of.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { changesInLines } from "#app/lib/since-release.ts";
import { statusPath } from "#app/lib/status-path.ts";
import { inPlaceOf } from "#app/policies/permissions.ts";
import { releaseObstacles } from "#app/policies/release.ts";
import type { SheetDocument as Document } from "#app/schemas/sheet-document.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireRecentProof } from "../people/recent-proof.server.ts";
import { lastReleased } from "./last-released.server.ts";
import { inForce, releaseCaseOf } from "./release-case.server.ts";
import { findRevision, lockedRevision, type FoundRevision } from "./revision.server.ts";
import { setSheet, type SetFile } from "./set-sheet.server.ts";
import { sheetSourceOf } from "./sheet-source.server.ts";
import { tellReleased } from "./tell.server.ts";

const RELEASE = "release, return and withdraw sheets";

interface Prepared {
  at: Date;
  token: string;
  number: number;
  changes: string[];
  /** what the paper was made from beside the assessment; a release in which it differs is refused */
  basis: string;
  documents: { leg: number; document: Document }[];
}

/**
 * Releases a revision: gives it its letter, freezes its papers, and ends the revision before it in the same transaction. The papers are
 * drawn before that transaction begins, which then looks again whether everything still is as they say.
 * @param origin beginning of the address that the code on paper leads to
 * @throws 403 without a recent proof of who releases, 409 with everything that stands in the way
 */
export async function releaseRevision(
  scope: ActorScope,
  revisionId: string | undefined,
  remark: string,
  origin: string,
): Promise<void> {
  requireRecentProof(scope);
  const prepared = await inScope(scope, (em) => prepare(em, scope, revisionId, origin));
  const files: (SetFile & { leg: number })[] = [];
  for (const { leg, document } of prepared.documents)
    for (const file of await setSheet(document)) files.push({ leg, ...file });
  await inScope(scope, (em) => commit(em, scope, revisionId, remark, prepared, files));
}

async function prepare(
  em: EntityManager,
  scope: ActorScope,
  revisionId: string | undefined,
  origin: string,
): Promise<Prepared> {
  const revision = await findRevision(em, scope, revisionId, RELEASE);
  const { last, basis, deviations, assessment } = await standing(em, scope, revision);
  const at = new Date();
  const token = randomBytes(16).toString("base64url");
  const number = (last?.number ?? 0) + 1;
  const changes = last ? changesInLines(last.before, assessment, last.changes) : [];
  const release = {
    number: recordNumber("sheet", revision.program.slug, revision.sheet.number),
    revision: revisionLetters(number),
    status: "released" as const,
    supersededBy: null,
    effectiveFrom: at.toISOString(),
    preparedBy: assessment.createdBy.name,
    checkedBy: scope.actor.name,
    releasedBy: signatureOf(scope, revision.program.id),
    statusAddress: `${origin}${statusPath(token)}`,
    changes,
    deviations,
  };
  const sources = await sheetSourceOf(em, scope, assessment.id);
  const documents = sources.map((source) => ({
    leg: source.leg ?? 0,
    document: sheetDocumentOf(source, { release, lots: [], whomToCall: null }),
  }));
  return { at, token, number, changes, basis, documents };
}

/** Who signs, and in whose place where it is in somebody's. */
function signatureOf({ actor }: ActorScope, programId: string): string {
  const [owner] = inPlaceOf(actor, RELEASE, programId);
  return owner ? `${actor.name}, for ${owner.name}` : actor.name;
}

/** Everything that a release rests on, as it is now. @throws 409 when something stands in the way */
async function standing(em: EntityManager, scope: ActorScope, revision: FoundRevision) {
  const { releaseCase, assessment, deviations, blocking } = await releaseCaseOf(em, scope, revision);
  const obstacles = releaseObstacles(scope.actor.id, inPlaceOf(scope.actor, RELEASE, revision.program.id), releaseCase);
  if (obstacles.length > 0) throw problem(409, obstacles.map(({ what, remedy }) => `${what} ${remedy}`).join(" "));
  await em.populate(assessment, ["createdBy"]);
  const last = await lastReleased(em, scope, revision.sheet.id, assessment);
  const valid = deviations.filter((each) => inForce(each));
  const titles = new Map(blocking.map(({ key, step, title }) => [key, `step ${step}, ${title.toLowerCase()}`]));
  return {
    assessment,
    last,
    basis: [last?.id ?? "first", ...valid.map(({ id }) => id)].join(" "),
    deviations: valid.map(({ findings, reason, scope: within, until }) => ({
      text: `Deviation for ${findings.map((key) => titles.get(key) ?? key).join("; ")}: ${withoutStop(reason)}`,
      scope: withoutStop(within),
      until: minuteOf(until.toISOString()),
    })),
  };
}

const withoutStop = (text: string) => text.replace(/[.\s]+$/, "");

async function commit(
  em: EntityManager,
  scope: ActorScope,
  revisionId: string | undefined,
  remark: string,
  { at, token, number, changes, basis, documents }: Prepared,
  files: readonly (SetFile & { leg: number })[],
): Promise<void> {
  const revision = await lockedRevision(em, scope, revisionId, RELEASE);
  if ((await standing(em, scope, revision)).basis !== basis)
    throw problem(409, "A deviation or another release came in between. Look at the page again, then release.");
  const former = await em.findOne(
    SheetRevision,
    { sheet: revision.sheet.id, state: "released" },
    { populate: ["sheet", "program", "askedBy", "decidedBy", "endedBy"] },
  );
  if (former) {
    Object.assign(former, { state: "superseded", supersededBy: number, endedAt: at });
    // Only one revision of a sheet is released at a time: the old one goes first.
    await em.flush();
  }
  const { actor } = scope;
  Object.assign(revision, {
    state: "released",
    number,
    token,
    changes,
    decidedAt: at,
    decidedBy: actor.id,
    reason: remark,
  });
  const of = { program: revision.program.id, revision: revision.id };
  for (const each of documents) em.create(SheetDocument, { id: randomUUID(), ...of, ...each });
  for (const file of files)
    em.create(SheetFile, {
      id: randomUUID(),
      ...of,
      ...file,
      bytes: Buffer.from(file.bytes),
      mark: "",
      sha256: createHash("sha256").update(file.bytes).digest("hex"),
      createdAt: at,
    });
  await em.flush();
  await tellReleased(em, scope, revision, former);
}
