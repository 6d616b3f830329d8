import { hash } from "@node-rs/argon2";
import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const account = () => import("#app/services/people/own-account.server.ts");
const sessions = () => import("#app/services/sessions.server.ts");

beforeAll(() => account(), 60_000);

/** Somebody's scope with a session of their own, begun in that browser, and its token. */
async function signedIn(who: string, browser: string): Promise<{ scope: ActorScope; token: string }> {
  const { startSession, resumeSession } = await sessions();
  const scope = await scopeOfPerson(database, who);
  const { token } = await startSession(scope.actor.id, browser, "test");
  return { scope: { ...scope, session: (await resumeSession(token, "test"))?.session ?? null }, token };
}

const runs = async (token: string) => (await (await sessions()).resumeSession(token, "test")) !== null;

test("a person sees and ends their own sessions and nobody else's", async () => {
  const { ownSessions, endOwnSession } = await account();
  const there = await signedIn("engineer", "there");
  const here = await signedIn("engineer", "here");
  const other = await signedIn("technician", "theirs");
  const listed = await ownSessions(here.scope);
  expect(listed.map(({ userAgent, isThis }) => [userAgent, isThis])).toEqual([
    ["here", true],
    ["there", false],
  ]);
  const [foreign] = await ownSessions(other.scope);
  await endOwnSession(here.scope, foreign?.id);
  expect(await runs(other.token)).toBe(true);
  await endOwnSession(here.scope, listed[1]?.id);
  expect(await runs(there.token)).toBe(false);
  expect(await runs(here.token)).toBe(true);
  const { id } = here.scope.session ?? { id: "" };
  const left = { ...here.scope, session: { id, provenAt: 0, codes: "off" as const } };
  await expect(endOwnSession(left, id)).rejects.toMatchObject({ init: { status: 403 } });
});

test("where one session too many begins, the one that was used least lately ends", async () => {
  const { MOST_SESSIONS } = await sessions();
  const first = await signedIn("guest", "first");
  const used = await signedIn("guest", "used");
  await asOwner(
    database,
    "update session set last_seen_at = now() + interval '1 minute' where person_id = ? and user_agent = 'used'",
    [used.scope.actor.id],
  );
  for (let more = 2; more < MOST_SESSIONS; more += 1) await signedIn("guest", "more");
  expect([await runs(first.token), await runs(used.token)]).toEqual([true, true]);
  await signedIn("guest", "one too many");
  expect([await runs(first.token), await runs(used.token)]).toEqual([false, true]);
});

test("a password is changed by who knows the old one; every other session ends and a mail tells", async () => {
  const { changePassword } = await account();
  const there = await signedIn("shift-lead", "there");
  const { scope, token } = await signedIn("shift-lead", "here");
  const { id, email } = scope.actor;
  await asOwner(database, "delete from credential where person_id = ?", [id]);
  await asOwner(
    database,
    "insert into credential (id, person_id, password_hash, changed_at) values (gen_random_uuid(), ?, ?, now())",
    [id, await hash("the old one of them")],
  );
  const current = "the old one of them";
  const password = "three carriers wait for resin";
  expect(await changePassword(scope, { current: "a guess", password })).toHaveProperty("current");
  expect(await changePassword(scope, { current, password: "short" })).toHaveProperty("password");
  expect(await runs(there.token)).toBe(true);
  expect(await changePassword(scope, { current, password })).toBeNull();
  expect(await runs(token)).toBe(true);
  expect(await runs(there.token)).toBe(false);
  const { personWithPassword } = await import("#app/services/sign-in.server.ts");
  expect(await personWithPassword(email, password, "test")).toBe(id);
  expect(await personWithPassword(email, current, "test")).toBeNull();
  const mails = await asOwner<{ kind: string }>(database, "select kind from mail_outbox where person_id = ?", [id]);
  expect(mails).toEqual([{ kind: "password changed" }]);
  await expect(changePassword({ ...scope, session: null }, { current, password })).rejects.toMatchObject({
    init: { status: 403 },
  });
});
