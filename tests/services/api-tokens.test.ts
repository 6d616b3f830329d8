import { beforeAll, expect, test } from "vitest";
import type { NewToken } from "#app/schemas/api-token.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const tokens = () => import("#app/services/api/tokens.server.ts");
const bearers = () => import("#app/services/api/token-actor.server.ts");
const scopes = () => import("#app/server/scope.server.ts");

const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;

let engineer: ActorScope;
let technician: ActorScope;
let administrator: ActorScope;

beforeAll(async () => {
  await Promise.all([tokens(), bearers()]);
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  administrator = await scopeOfPerson(database, "administrator");
}, 90_000);

const programOf = ({ actor }: ActorScope, slug: string) =>
  actor.memberships.find(({ programSlug }) => programSlug === slug)?.programId ?? "";

async function make(by: ActorScope, more: Partial<NewToken> = {}): Promise<string> {
  const made = await (
    await tokens()
  ).makeToken(by, {
    intent: "make",
    name: "Bow gauge",
    program: programOf(by, "tern"),
    scopes: ["stacks:read"],
    days: 30,
    ...more,
  });
  if ("refused" in made) throw new Error(made.refused);
  return made.token;
}

async function bearer(token: string) {
  return (await bearers()).bearerOf(token, "test");
}

test("a token speaks for its person in its program alone, and its secret is kept nowhere", async () => {
  const token = await make(engineer);
  const found = await bearer(token);
  expect(found?.actor.id).toBe(engineer.actor.id);
  expect(found?.actor.memberships.map(({ programSlug }) => programSlug)).toEqual(["tern"]);
  expect(found?.scopes).toEqual(["stacks:read"]);
  expect(await bearer(`${token.slice(0, -1)}${token.endsWith("A") ? "B" : "A"}`)).toBeNull();
  expect(await bearer("pwd_")).toBeNull();
  const kept = await asOwner<{ all: string }>(
    database,
    "select to_jsonb(t)::text as all from api_token t union all select to_jsonb(a)::text from audit_event a where a.subject = 'API token'",
  );
  expect(kept.length).toBeGreaterThan(1);
  for (const { all } of kept) expect(all).not.toContain(token.slice(8));
  const events = await asOwner<{ to: unknown }>(
    database,
    `select "to" from audit_event where subject = 'API token' and action = 'created'`,
  );
  expect(JSON.stringify(events)).not.toContain("okenHash");
});

test("below the services the database knows no other program for it, and no administrator", async () => {
  const { inScope } = await scopes();
  const found = await bearer(await make(engineer));
  if (!found) throw new Error("The token is not good.");
  const narrow = { actor: found.actor, requestId: "test", onlyProgram: found.programId };
  const slugs = await inScope(narrow, (em) =>
    em.execute<{ slug: string }[]>("select p.slug from stack s join program p on p.id = s.program_id"),
  );
  expect(slugs.map(({ slug }) => slug)).toEqual(["tern"]);
  const { session } = engineer;
  await expect(make({ ...narrow, ...(session && { session }) } as ActorScope)).rejects.toThrow(/row-level security/);
  const asAdministrator = { ...administrator, onlyProgram: programOf(engineer, "tern") };
  expect(await inScope(asAdministrator, (em) => em.execute("select 1 from api_token"))).toEqual([]);
});

test("a token that is revoked or over does nothing, nor does that of somebody who left or is not active", async () => {
  const { tokensView, revokeToken } = await tokens();
  const token = await make(technician, { name: "To be revoked" });
  const row = (await tokensView(technician)).rows.find(({ name }) => name === "To be revoked");
  if (!row) throw new Error("The token is not listed.");
  await expect(revokeToken(engineer, row.id)).rejects.toEqual(status(404));
  await revokeToken(technician, row.id);
  expect(await bearer(token)).toBeNull();
  await expect(revokeToken(technician, row.id)).rejects.toEqual(status(409));

  const other = await make(technician, { name: "Other" });
  expect(await bearer(other)).not.toBeNull();
  await asOwner(database, "update person set active = false where id = ?", [technician.actor.id]);
  expect(await bearer(other)).toBeNull();
  await asOwner(database, "update person set active = true where id = ?", [technician.actor.id]);
  await asOwner(database, "update membership set role = 'guest' where person_id = ?", [technician.actor.id]);
  expect((await bearer(other))?.actor.memberships[0]?.role).toBe("guest");
  await asOwner(database, "delete from membership where person_id = ?", [technician.actor.id]);
  expect(await bearer(other)).toBeNull();

  const over = await make(engineer, { days: 1 });
  await asOwner(database, "alter table api_token disable trigger keep_api_token");
  await asOwner(database, "update api_token set expires_at = now() where beginning = ?", [over.slice(0, 8)]);
  await asOwner(database, "alter table api_token enable trigger keep_api_token");
  expect(await bearer(over)).toBeNull();
});

test("an administrator sees those of everybody and may revoke them; nobody else does", async () => {
  const { tokensView, revokeToken } = await tokens();
  const token = await make(engineer, { name: "Of the engineer" });
  expect((await tokensView(engineer)).rows.every(({ mine }) => mine)).toBe(true);
  const seen = (await tokensView(administrator)).rows.find(({ name }) => name === "Of the engineer");
  expect(JSON.stringify(seen)).not.toContain(token);
  await revokeToken(administrator, seen?.id ?? "");
  expect(await bearer(token)).toBeNull();
});

test("nobody makes one for a foreign program, for longer than a year, or for somebody else", async () => {
  await expect(make(engineer, { program: "7c0ad0c2-6a5d-4d86-8f30-3e1f1d0f3a11" })).rejects.toEqual(status(404));
  const { inScope } = await scopes();
  const insert = (person: string, days: number) =>
    inScope(engineer, (em) =>
      em.execute(
        `insert into api_token (id, person_id, program_id, name, token_hash, beginning, scopes, created_at, expires_at)
         values (gen_random_uuid(), ?, ?, 'x', gen_random_uuid()::text, 'x', '[]', now(), now() + make_interval(days => ?))`,
        [person, programOf(engineer, "tern"), days],
      ),
    );
  await expect(insert(administrator.actor.id, 1)).rejects.toThrow(/row-level security/);
  await expect(insert(engineer.actor.id, 400)).rejects.toThrow(/row-level security/);
  await expect(
    inScope(engineer, (em) =>
      em.execute("update api_token set scopes = '[]', revoked_by_id = app_person() where revoked_at is null"),
    ),
  ).rejects.toThrow(/else never changes/);
});
