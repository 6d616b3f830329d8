import { beforeAll, expect, test } from "vitest";
import type { Announcement } from "#app/schemas/announcement.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { heardOf, listen } from "./listening.ts";

const database = useDatabase({ demo: true });
const looking = () => import("#app/services/assessments/announce-out-of-date.server.ts");

let engineer: ActorScope;
let owner: ActorScope;

beforeAll(async () => {
  engineer = await scopeOfPerson(database, "engineer");
  owner = await scopeOfPerson(database, "process-owner");
  await looking();
}, 60_000);

interface Row {
  email: string;
  key: string;
  state: string;
  announcement: Extract<Announcement, { kind: "assessment out of date" }>;
}

const rows = () =>
  asOwner<Row>(
    database,
    `select split_part(p.email, '@', 1) as email, m.key, m.state, m.announcement
       from mail_outbox m join person p on p.id = m.person_id where m.kind = 'assessment out of date' order by p.email, m.key`,
  );
const look = async () => (await looking()).announceOutOfDate();

/** Assesses a demo flow as the engineer; the answer is its id. */
async function assess(name: string): Promise<string> {
  const { runAssessment } = await import("#app/services/assessments/assessments.server.ts");
  const [flow] = await asOwner<{ id: string }>(database, "select id from flow where name = ?", [name]);
  const run = await runAssessment(engineer, flow?.id ?? "");
  if (run.outcome !== "stored") throw new Error(`not assessed: ${JSON.stringify(run)}`);
  return run.id;
}

/** As if a film had been saved by somebody. */
const saveFilm = (name: string, stress: number, by: ActorScope) =>
  asOwner(
    database,
    `update film set stress = jsonb_set(stress, '{value}', to_jsonb(?::float)), version = version + 1, updated_at = now() + interval '1 minute',
            updated_by_id = ? where name = ?`,
    [stress, by.actor.id, name],
  );

test("a save tells who prepared the newest assessment and the process owners, each once, but not who saved", async () => {
  const [flow] = await asOwner<{ name: string; film: string }>(
    database,
    `select f.name, film.name as film from flow f join flow_step s on s.flow_id = f.id join flow_step_film u on u.step_id = s.id
       join film on film.id = u.film_id join program p on p.id = f.program_id
      where p.slug = 'tern' order by f.name, s.position limit 1`,
  );
  const id = await assess(flow?.name ?? "");
  // What the demo itself came with may be out of date; this one is not.
  await look();
  expect((await rows()).map(({ key }) => key)).not.toContain(id);

  await listen(database, "engineer", "tern");
  await saveFilm(flow?.film ?? "", 123e6, owner);
  await look();
  await look();
  const of = (await rows()).filter(({ key }) => key === id);
  expect(of.map(({ email, state }) => [email, state])).toEqual([
    ["engineer", "digest"],
    ["second-process-owner", "digest"],
  ]);
  expect(of[0]?.announcement).toMatchObject({ program: "Tern", flow: flow?.name, path: `/assessments/${id}` });
  expect(of[0]?.announcement.assessment).toMatch(/^TERN-A\d{3}$/);
  expect(await heardOf(database, id)).toMatchObject([
    {
      event: "assessment.out_of_date",
      program: { slug: "tern", name: "Tern" },
      data: { assessment_id: id, assessment: of[0]?.announcement.assessment, flow: flow?.name },
    },
  ]);
  expect(of[0]?.announcement.changes.join()).toContain(flow?.film);
  // A recipe does not leave the site by mail.
  expect(JSON.stringify(of[0]?.announcement)).not.toMatch(/123|MPa/);
});
