import type { ActorScope } from "#app/server/scope.server.ts";

/*
 * One deed on a sheet in a process of its own, so that a test can kill it in the middle. Its argument says which deed, by whom, and on
 * what, as JSON.
 */

export interface Deed {
  kind: "ask" | "return" | "release" | "withdraw";
  scope: ActorScope;
  /** id of the assessment where a review is asked for, of the revision for all else */
  id: string;
}

async function work({ kind, scope, id }: Deed): Promise<void> {
  if (kind === "ask") {
    const { askReview } = await import("#app/services/sheets/ask-review.server.ts");
    await askReview(scope, id, "");
  } else if (kind === "return") {
    const { returnRevision } = await import("#app/services/sheets/review-deeds.server.ts");
    await returnRevision(scope, id, { reason: "Take the thicker carrier" });
  } else if (kind === "release") {
    const { releaseRevision } = await import("#app/services/sheets/release.server.ts");
    await releaseRevision(scope, id, "", "https://planeward.site.example");
  } else {
    const { withdrawRevision } = await import("#app/services/sheets/withdraw.server.ts");
    await withdrawRevision(scope, id, "The tape was recalled");
  }
}

const { closeOrm } = await import("#app/db/orm.server.ts");
await work(JSON.parse(process.argv[2] ?? "") as Deed);
await closeOrm();
