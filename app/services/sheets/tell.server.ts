import type { EntityManager } from "@mikro-orm/postgresql";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import type { AnnouncementInput } from "#app/schemas/announcement.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { raiseEvent } from "../webhooks/raise-event.server.ts";
import { announce } from "../mail/announce.server.ts";
import { peopleOf } from "../people/people-of.server.ts";
import { findRevision, type FoundRevision } from "./revision.server.ts";

/** Tells the process owners of the program, and who stands in for one, that a review waits for one of them. */
export async function tellReviewAsked(em: EntityManager, scope: ActorScope, revisionId: string): Promise<void> {
  const revision = await findRevision(em, scope, revisionId);
  const owners = (await peopleOf(em, revision.program.id)).filter(
    ({ role, stands_in }) => role === "process owner" || stands_in,
  );
  const path = reviewPath(revision);
  await tell(
    em,
    scope,
    revision,
    owners.map(({ id }) => id),
    { kind: "review asked", ...about(scope, revision, path), note: revision.note },
  );
}

/** Tells whoever asked for the review that it came back, and why. */
export async function tellReviewReturned(em: EntityManager, scope: ActorScope, revisionId: string): Promise<void> {
  const revision = await findRevision(em, scope, revisionId);
  await tell(em, scope, revision, [revision.askedBy.id], {
    kind: "review returned",
    ...about(scope, revision, reviewPath(revision)),
    reason: revision.reason ?? "",
  });
}

/** Tells everybody of the program, its guests as well, that a sheet is released, and whose place it takes. */
export async function tellReleased(
  em: EntityManager,
  scope: ActorScope,
  revision: FoundRevision,
  superseded: FoundRevision | null,
): Promise<void> {
  const everybody = (await peopleOf(em, revision.program.id)).map(({ id }) => id);
  await tell(em, scope, revision, everybody, {
    kind: "sheet released",
    ...about(scope, revision, sheetPath(revision)),
    revision: letterOf(revision),
    changes: revision.changes ?? [],
  });
  const released = eventData(revision);
  await raiseEvent(em, {
    ...raisedBy(scope, revision),
    event: "sheet.released",
    about: `${released.sheet} ${released.revision}`,
    data: released,
  });
  if (superseded) {
    await tell(em, scope, superseded, everybody, {
      kind: "sheet superseded",
      ...about(scope, superseded, sheetPath(revision)),
      revision: letterOf(superseded),
      supersededBy: letterOf(revision),
    });
    const former = eventData(superseded);
    await raiseEvent(em, {
      ...raisedBy(scope, superseded),
      event: "sheet.superseded",
      about: `${former.sheet} ${former.revision}`,
      data: { ...former, superseded_by: released.revision },
    });
  }
}

/** Tells everybody of the program that a sheet must not be used any more. */
export async function tellWithdrawn(em: EntityManager, scope: ActorScope, revision: FoundRevision): Promise<void> {
  const everybody = (await peopleOf(em, revision.program.id)).map(({ id }) => id);
  await tell(em, scope, revision, everybody, {
    kind: "sheet withdrawn",
    ...about(scope, revision, "/sheets"),
    revision: letterOf(revision),
    reason: revision.endReason ?? "",
  });
}

const letterOf = ({ number }: FoundRevision) => revisionLetters(number ?? 1);
const reviewPath = ({ assessment }: FoundRevision) => `/assessments/${assessment.id}/review`;
const sheetPath = ({ id }: FoundRevision) => `/sheets/revisions/${id}`;

const eventData = (revision: FoundRevision) => ({
  revision_id: revision.id,
  assessment_id: revision.assessment.id,
  sheet: recordNumber("sheet", revision.program.slug, revision.sheet.number),
  revision: letterOf(revision),
  flow: revision.title,
});

const raisedBy = ({ actor }: ActorScope, { id, program }: FoundRevision) => ({
  program: { id: program.id, slug: program.slug, name: program.name },
  key: id,
  by: actor.id,
});

function about({ actor }: ActorScope, { program, sheet, title }: FoundRevision, path: string) {
  return {
    program: program.name,
    by: actor.name,
    path,
    sheet: recordNumber("sheet", program.slug, sheet.number),
    flow: title,
  };
}

function tell(
  em: EntityManager,
  { actor }: ActorScope,
  { id, program }: FoundRevision,
  to: string[],
  announcement: AnnouncementInput,
): Promise<void> {
  return announce(em, { program: program.id, announcement, key: id, to, by: actor.id });
}
