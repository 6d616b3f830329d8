import { afterEach, expect, test, vi } from "vitest";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { scopeOfPerson } from "#tests/db/people.ts";

const database = useDatabase({ demo: true });

const sessions = () => import("#app/services/sessions.server.ts");
const MINUTE = 60_000;

afterEach(() => {
  vi.useRealTimers();
});

/** Moves the clock of this process on; the database's own clock decides nothing here. */
function later(milliseconds: number) {
  vi.useFakeTimers({ now: Date.now() + milliseconds, toFake: ["Date"] });
}

async function started(account = "engineer") {
  const { startSession } = await sessions();
  const { actor } = await scopeOfPerson(database, account);
  return { actor, ...(await startSession(actor.id, "a browser", "test")) };
}

test("a session says who somebody is, with all memberships", async () => {
  const { resumeSession } = await sessions();
  const { token, actor } = await started();
  const resumed = await resumeSession(token, "test");
  expect(resumed?.renewed).toBeNull();
  expect(resumed?.actor).toMatchObject({ id: actor.id, name: actor.name, email: actor.email, siteRole: null });
  expect(resumed?.actor.memberships.map(({ programSlug }) => programSlug).sort()).toEqual(["fulmar", "petrel", "tern"]);
});

test("the database never holds the token itself", async () => {
  const { token } = await started();
  const rows = await asOwner<{ token_hash: string }>(database, "select token_hash from session");
  expect(rows.map(({ token_hash }) => token_hash)).not.toContain(token);
});

test("a token that was never given is nobody", async () => {
  const { resumeSession } = await sessions();
  expect(await resumeSession("made up", "test")).toBeNull();
});

test("a token in use is replaced after a quarter of an hour; the old one is good for a minute more", async () => {
  const { resumeSession } = await sessions();
  const { token, actor } = await started();
  later(16 * MINUTE);
  const renewed = (await resumeSession(token, "test"))?.renewed;
  expect(renewed?.token).toBeDefined();
  expect(renewed?.token).not.toBe(token);
  expect((await resumeSession(token, "test"))?.actor.id).toBe(actor.id);
  expect((await resumeSession(renewed?.token ?? "", "test"))?.actor.id).toBe(actor.id);
  later(2 * MINUTE);
  expect(await resumeSession(token, "test")).toBeNull();
  expect((await resumeSession(renewed?.token ?? "", "test"))?.actor.id).toBe(actor.id);
});

test("a session ends after eight hours without use", async () => {
  const { resumeSession, IDLE_LIFETIME } = await sessions();
  const { token } = await started();
  later(IDLE_LIFETIME + MINUTE);
  expect(await resumeSession(token, "test")).toBeNull();
});

test("a session in use ends after a day all the same", async () => {
  const { resumeSession, ABSOLUTE_LIFETIME } = await sessions();
  let { token } = await started();
  for (let hours = 0; hours < 23; hours += 4) {
    later(4 * 60 * MINUTE);
    token = (await resumeSession(token, "test"))?.renewed?.token ?? token;
  }
  later(ABSOLUTE_LIFETIME);
  expect(await resumeSession(token, "test")).toBeNull();
});

test("signing out ends it at once, and twice is no error", async () => {
  const { endSession, resumeSession } = await sessions();
  const { token } = await started();
  await endSession(token, "test");
  await endSession(token, "test");
  expect(await resumeSession(token, "test")).toBeNull();
});

test("whoever is no longer active is nobody, session or not", async () => {
  const { resumeSession } = await sessions();
  const { token, actor } = await started("technician");
  await asOwner(database, "update person set active = false where id = ?", [actor.id]);
  expect(await resumeSession(token, "test")).toBeNull();
  await asOwner(database, "update person set active = true where id = ?", [actor.id]);
});
