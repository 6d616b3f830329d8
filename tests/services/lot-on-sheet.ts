import { randomUUID } from "node:crypto";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, type useDatabase } from "#tests/db/test-database.ts";

type Database = ReturnType<typeof useDatabase>;

/** Assesses the first flow of a program as it is now. @returns id of the assessment */
export async function assessFirstFlow(database: Database, slug: string): Promise<string> {
  const { runAssessment } = await import("#app/services/assessments/assessments.server.ts");
  const [flow] = await asOwner<{ id: string }>(
    database,
    "select f.id from flow f join program p on p.id = f.program_id where p.slug = ? order by f.name limit 1",
    [slug],
  );
  const ran = await runAssessment(await scopeOfPerson(database, "engineer"), flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.outcome);
  return ran.id;
}

/** Assesses the first flow of a program, has it reviewed and releases it. @returns id of the revision */
export async function releaseFirstFlow(database: Database, slug: string): Promise<string> {
  const { askReview } = await import("#app/services/sheets/ask-review.server.ts");
  const { reviewPage } = await import("#app/services/sheets/review-page.server.ts");
  const { releaseRevision } = await import("#app/services/sheets/release.server.ts");
  const engineer = await scopeOfPerson(database, "engineer");
  const assessment = await assessFirstFlow(database, slug);
  await askReview(engineer, assessment, "");
  const id = (await reviewPage(engineer, assessment)).revision?.id ?? "";
  await releaseRevision(await scopeOfPerson(database, "process-owner"), id, "", "https://planeward.site.example");
  return id;
}

/** A lot of a program, on no sheet. @returns its id */
export async function newLot(database: Database, name: string, slug: string): Promise<string> {
  const id = randomUUID();
  const { actor } = await scopeOfPerson(database, "engineer");
  await asOwner(
    database,
    `insert into lot (id, program_id, name, note, created_at, created_by_id)
       select ?, p.id, ?, '', now(), ? from program p where p.slug = ?`,
    [id, name, actor.id, slug],
  );
  return id;
}
