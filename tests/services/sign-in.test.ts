import { beforeAll, expect, test } from "vitest";
import { createDemoAccounts, setDemoPasswords } from "#app/db/seeders/demo-accounts.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const accounts = createDemoAccounts();

beforeAll(async () => {
  await setDemoPasswords(database.owner, accounts);
});

const signIn = async (email: string, password: string) =>
  (await import("#app/services/sign-in.server.ts")).personWithPassword(email, password, "test");

test("every demo account opens with its own password, whatever the case of the address", async () => {
  for (const { email, password } of accounts)
    expect(await signIn(email.toUpperCase(), password)).toMatch(/^[0-9a-f-]{36}$/);
});

test("a wrong password, another's password and an unknown address are all nobody", async () => {
  const [first, second] = accounts;
  expect(await signIn(first?.email ?? "", "not it")).toBeNull();
  expect(await signIn(first?.email ?? "", second?.password ?? "")).toBeNull();
  expect(await signIn("nobody@kestrel-ridge.example", "not it")).toBeNull();
});

test("an unknown address takes as long as a wrong password, so that time tells nothing", async () => {
  const time = async (email: string) => {
    const begun = performance.now();
    for (let round = 0; round < 5; round++) await signIn(email, "not it");
    return performance.now() - begun;
  };
  await time("nobody@kestrel-ridge.example");
  const [known, unknown] = [await time(accounts[0]?.email ?? ""), await time("nobody@kestrel-ridge.example")];
  expect(unknown / known).toBeGreaterThan(0.5);
  expect(unknown / known).toBeLessThan(2);
});

test("every attempt is noted, a refused one without an actor", async () => {
  await signIn(accounts[0]?.email ?? "", "not it");
  const [event] = await asOwner<{ action: string; actor_id: string | null; subject_id: string | null }>(
    database,
    "select action, actor_id, subject_id from audit_event where subject = 'session' order by at desc limit 1",
  );
  expect(event).toMatchObject({ action: "refused", actor_id: null });
  expect(event?.subject_id).not.toBeNull();
});

test("the password is kept as argon2id and nothing else", async () => {
  const rows = await asOwner<{ password_hash: string }>(database, "select password_hash from credential");
  expect(rows).toHaveLength(accounts.length);
  for (const { password_hash } of rows) expect(password_hash).toMatch(/^\$argon2id\$/);
});
