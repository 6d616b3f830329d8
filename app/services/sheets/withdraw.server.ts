import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { lockedRevision } from "./revision.server.ts";
import { tellWithdrawn } from "./tell.server.ts";

/** Withdraws a released revision: from now on its paper and its code say that it must not be used. @throws 409 when it is not released */
export async function withdrawRevision(
  scope: ActorScope,
  revisionId: string | undefined,
  reason: string,
): Promise<void> {
  await inScope(scope, async (em) => {
    const revision = await lockedRevision(em, scope, revisionId, "release, return and withdraw sheets");
    if (revision.state !== "released")
      throw problem(409, `This revision is ${revision.state}: only a released one can be withdrawn.`);
    Object.assign(revision, {
      state: "withdrawn",
      endedAt: new Date(),
      endedBy: scope.actor.id,
      endReason: reason,
    });
    await em.flush();
    await tellWithdrawn(em, scope, revision);
  });
}
