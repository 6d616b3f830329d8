import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const view = () => import("#app/services/demo/demo-view.server.ts");
const removal = () => import("#app/services/demo/remove-demo.server.ts");

let owner: ActorScope;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([view(), removal(), import("#app/services/sheets/release.server.ts")]);
  owner = await scopeOfPerson(database, "process-owner");
}, 90_000);

/** A released sheet of the demo, printed once. */
async function releaseOne(): Promise<void> {
  const engineer = await scopeOfPerson(database, "engineer");
  const { runAssessment } = await import("#app/services/assessments/assessments.server.ts");
  const { askReview } = await import("#app/services/sheets/ask-review.server.ts");
  const { releaseRevision } = await import("#app/services/sheets/release.server.ts");
  const { printSheet } = await import("#app/services/sheets/sheet-file.server.ts");
  const [flow] = await asOwner<{ id: string }>(
    database,
    "select f.id from flow f join program p on p.id = f.program_id where p.slug = 'tern' order by f.name limit 1",
  );
  const ran = await runAssessment(engineer, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.outcome);
  await askReview(engineer, ran.id, "");
  const [revision] = await asOwner<{ id: string }>(database, "select id from sheet_revision");
  await releaseRevision(owner, revision?.id, "", "https://planeward.site.example");
  await printSheet(engineer, revision?.id, { paper: "a4", pages: "all", leg: 0, place: "Grinder 2" });
}

test(
  "sheets that were released in the demo are counted before it goes, and go with it",
  { timeout: 60_000 },
  async () => {
    await releaseOne();
    const seen = await (await view()).demoView(owner);
    if (seen.state !== "here") throw new Error(seen.state);
    expect(seen.goes).toContainEqual({ kind: "revision of a sheet", total: 1 });
    const removed = await (
      await removal()
    ).removeTheDemo(owner, { confirm: "remove", name: "Kestrel", diameter: "200", seen: seen.seen });
    expect(removed).toEqual({ outcome: "removed" });
    for (const table of ["sheet", "sheet_revision", "sheet_document", "sheet_file", "sheet_print", "mail_outbox"])
      expect([table, await asOwner(database, `select id from "${table}"`)]).toEqual([table, []]);
  },
);
