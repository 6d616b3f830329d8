import type { ClearForm, HoldForm, StopForm } from "#app/schemas/block-form.ts";
import type { FloorEntryForm } from "#app/schemas/floor-entry.ts";
import type { AssignForm } from "#app/schemas/lot-sheet-form.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

/*
 * One deed on a sheet or a lot in a process of its own, so that a test can kill it in the middle. Its argument says which deed, by whom, and on
 * what, as JSON.
 */

export type Deed = SheetDeed | FloorDeed;

interface SheetDeed {
  kind: "ask" | "return" | "release" | "withdraw";
  scope: ActorScope;
  /** id of the assessment where a review is asked for, of the revision for all else */
  id: string;
}

/** What is done with a lot; `id` is the lot's. */
export type FloorDeed = { scope: ActorScope; id: string } & (
  | { kind: "assign"; form: Omit<AssignForm, "intent"> }
  | { kind: "enter"; form: FloorEntryForm }
  | { kind: "hold"; form: Omit<HoldForm, "intent"> }
  | { kind: "stop"; form: Omit<StopForm, "intent"> }
  | { kind: "clear"; form: Omit<ClearForm, "intent"> }
  | { kind: "report"; form: Record<string, string> }
);

async function workOnLot(deed: FloorDeed): Promise<void> {
  const { scope, id } = deed;
  if (deed.kind === "assign") {
    const { assignSheet } = await import("#app/services/floor/assign-sheet.server.ts");
    stored(await assignSheet(scope, id, deed.form));
  } else if (deed.kind === "enter") {
    const { enter } = await import("#app/services/floor/entries.server.ts");
    stored(await enter(scope, id, deed.form));
  } else if (deed.kind === "report") {
    const { reportFromFloor } = await import("#app/services/incidents/report-from-floor.server.ts");
    const form = new FormData();
    for (const [name, value] of Object.entries(deed.form)) form.set(name, value);
    const { outcome } = await reportFromFloor(scope, id, form, { files: [], faults: [] });
    if (outcome === "refused") throw new Error("the report was refused");
  } else {
    const { clearBlock, holdLot, stopStep } = await import("#app/services/floor/hold-and-stop.server.ts");
    if (deed.kind === "hold") await holdLot(scope, id, deed.form);
    else if (deed.kind === "stop") await stopStep(scope, id, deed.form);
    else await clearBlock(scope, id, deed.form);
  }
}

function stored(answer: { outcome: "stored" } | { outcome: "refused"; sentence: string }): void {
  if (answer.outcome === "refused") throw new Error(answer.sentence);
}

async function work(deed: Deed): Promise<void> {
  if ("form" in deed) return workOnLot(deed);
  const { kind, scope, id } = deed;
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
