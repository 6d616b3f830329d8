import type { EntityManager } from "@mikro-orm/postgresql";
import { redirect } from "react-router";
import { Deviation } from "#app/db/entities/deviation.ts";
import { SheetFile } from "#app/db/entities/sheet-file.ts";
import { SheetPrint } from "#app/db/entities/sheet-print.ts";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { slotsInWords } from "#app/engine/flow/legs.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { RevisionView } from "#app/schemas/sheet-view.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { findRevision, type FoundRevision } from "./revision.server.ts";
import { standingOf } from "./sheet-file.server.ts";

/**
 * The page of a released revision; one that is still in review is sent to its review.
 * @throws 404 for one that was not released to the reader
 */
export async function revisionPage(scope: ActorScope, revisionId: string | undefined): Promise<RevisionView> {
  return inScope(scope, async (em) => {
    const revision = await findRevision(em, scope, revisionId, "see released sheets");
    const standing = standingOf(revision);
    const { id, sheet, program, number, title, decidedAt, decidedBy, endedAt, endedBy } = revision;
    if (!standing || !number || !decidedAt) throw redirect(`/assessments/${revision.assessment.id}/review`);
    const staff = mayInProgram(scope.actor, "see the work", program.id);
    return {
      id,
      sheet: recordNumber("sheet", program.slug, sheet.number),
      letter: revisionLetters(number),
      state: standing.status,
      title,
      program: program.name,
      releasedAt: decidedAt.toISOString(),
      releasedBy: staff ? (decidedBy?.name ?? null) : null,
      remark: staff ? (revision.reason ?? "") : "",
      changes: staff ? (revision.changes ?? []) : [],
      supersededBy: await successor(em, revision),
      endedAt: endedAt?.toISOString() ?? null,
      endedBy: staff ? (endedBy?.name ?? null) : null,
      endReason: revision.endReason ?? null,
      papers: await papersOf(em, scope, revision, staff),
      deviations: staff ? await deviationsOf(em, id) : [],
      staff: staff ? await forStaff(em, scope, revision) : null,
    };
  });
}

async function successor(
  em: EntityManager,
  { sheet, supersededBy }: FoundRevision,
): Promise<RevisionView["supersededBy"]> {
  if (!supersededBy) return null;
  const next = await em.findOne(SheetRevision, { sheet: sheet.id, number: supersededBy }, { fields: ["id"] });
  return next && { letter: revisionLetters(supersededBy), id: next.id };
}

/** The papers of a revision, by their slots; what a guest may see of an assessment is on the paper alone. */
async function papersOf(
  em: EntityManager,
  scope: ActorScope,
  { id, assessment }: FoundRevision,
  staff: boolean,
): Promise<RevisionView["papers"]> {
  const files = await em.find(SheetFile, { revision: id, mark: "" }, { fields: ["leg"], orderBy: { leg: "asc" } });
  const numbers = [...new Set(files.map(({ leg }) => leg))];
  const legs = staff && numbers.length > 1 ? (await findAssessment(em, scope, assessment.id)).result.legs : undefined;
  return numbers.map((leg) => {
    const slots = legs?.[leg - 1]?.slots;
    return { leg, name: slots ? slotsInWords(slots) : leg === 0 ? "all slots" : `part ${leg}` };
  });
}

async function deviationsOf(em: EntityManager, id: string): Promise<RevisionView["deviations"]> {
  const signed = await em.find(Deviation, { revision: id, signedAt: { $ne: null } }, { orderBy: { until: "asc" } });
  const now = new Date();
  return signed.map(({ scope, until }) => ({ scope, until: until.toISOString(), over: until <= now }));
}

async function forStaff(
  em: EntityManager,
  { actor }: ActorScope,
  revision: FoundRevision,
): Promise<RevisionView["staff"]> {
  const prints = await em.find(
    SheetPrint,
    { revision: revision.id },
    { populate: ["createdBy", "file"], orderBy: { createdAt: "desc", id: "asc" }, limit: 100 },
  );
  const revisions = await em.find(
    SheetRevision,
    { sheet: revision.sheet.id, number: { $ne: null }, id: { $ne: revision.id } },
    { orderBy: { number: "desc" } },
  );
  return {
    assessmentId: revision.assessment.id,
    sheetId: revision.sheet.id,
    prints: prints.map(({ createdBy, createdAt, place, file }) => ({
      by: createdBy.name,
      at: createdAt.toISOString(),
      place,
      paper: file.paper,
      pages: file.pages,
    })),
    revisions: revisions.map(({ id, number, state, decidedAt, askedAt }) => ({
      id,
      letter: revisionLetters(number ?? 1),
      state,
      at: (decidedAt ?? askedAt).toISOString(),
    })),
    mayWithdraw:
      revision.state === "released" && mayInProgram(actor, "release, return and withdraw sheets", revision.program.id),
  };
}
