import { beforeAll, beforeEach, expect, test, vi } from "vitest";
import { createDemoAccounts, setDemoPasswords } from "#app/db/seeders/demo-accounts.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { secretIn, sendWaitingMail } from "./mailed-links.ts";

const database = useDatabase({ demo: true });
const passwords = () => import("#app/services/people/set-password.server.ts");
const door = () => import("#app/services/sign-in.server.ts");

const TECHNICIAN = "technician@kestrel-ridge.example";
const FRESH = "copper on glass, twice";

beforeAll(async () => {
  await setDemoPasswords(database.owner, createDemoAccounts());
  await Promise.all([passwords(), door()]);
}, 60_000);

beforeEach(() => asOwner(database, "delete from rate_limit"));

async function linkFor(email: string): Promise<string> {
  await (await passwords()).askForPassword(email, "test");
  return secretIn((await sendWaitingMail(database)).at(-1));
}

test("a link by mail sets a password once, ends every session and tells the person", async () => {
  const { passwordLink, setPasswordByLink } = await passwords();
  const { startSession, resumeSession } = await import("#app/services/sessions.server.ts");
  const { actor } = await scopeOfPerson(database, "technician");
  const { token } = await startSession(actor.id, "a browser", "test");
  const secret = await linkFor(TECHNICIAN.toUpperCase());
  expect(secret.length).toBeGreaterThan(40);
  // Looking uses nothing up.
  for (let looks = 0; looks < 2; looks++)
    expect(await passwordLink(secret, "test")).toEqual({ email: TECHNICIAN, isFirst: false });
  expect(await setPasswordByLink(secret, "short", "test")).toMatchObject({ outcome: "refused" });
  expect(await setPasswordByLink(secret, FRESH, "test")).toEqual({ outcome: "set" });
  expect(await setPasswordByLink(secret, `${FRESH} more`, "test")).toEqual({ outcome: "gone" });
  expect(await (await door()).personWithPassword(TECHNICIAN, FRESH, "test")).toBe(actor.id);
  expect(await resumeSession(token, "test")).toBeNull();
  const [notice] = await sendWaitingMail(database);
  expect(notice?.subject).toBe("Planeward: your password was changed");
  const trail = await asOwner<{ action: string }>(
    database,
    "select action from audit_event where subject = 'password' and request_id = 'test'",
  );
  expect(trail).toContainEqual({ action: "changed" });
});

test("of one link used by two at once, one sets the password", async () => {
  const { setPasswordByLink } = await passwords();
  const secret = await linkFor(TECHNICIAN);
  const both = await Promise.all([setPasswordByLink(secret, FRESH, "test"), setPasswordByLink(secret, FRESH, "test")]);
  expect(both.map(({ outcome }) => outcome).sort()).toEqual(["gone", "set"]);
});

test("no secret stands in the database: neither in the outbox, nor in the queue, nor with the token", async () => {
  const secret = await linkFor(TECHNICIAN);
  for (const table of ["mail_outbox", "person_token", "audit_event", "graphile_worker.jobs"]) {
    const rows = await asOwner<{ row: string }>(database, `select t::text as row from ${table} t`);
    for (const { row } of rows) expect(row).not.toContain(secret);
  }
});

test("a newer link ends the one before, and one of an hour ago works no more", async () => {
  const { passwordLink } = await passwords();
  const first = await linkFor(TECHNICIAN);
  const second = await linkFor(TECHNICIAN);
  expect(await passwordLink(first, "test")).toBeNull();
  expect(await passwordLink(second, "test")).not.toBeNull();
  vi.useFakeTimers({ now: Date.now() + 61 * 60_000, toFake: ["Date"] });
  expect(await passwordLink(second, "test")).toBeNull();
  vi.useRealTimers();
});

test("a mail that is sent a second time has another link, and both work", async () => {
  const { passwordLink } = await passwords();
  const first = await linkFor(TECHNICIAN);
  await asOwner(database, "update mail_outbox set state = 'waiting', sent_at = null where kind = 'password reset'");
  const again = (await sendWaitingMail(database)).map(secretIn).find((secret) => secret !== "") ?? "";
  expect(again).not.toBe(first);
  for (const secret of [first, again]) expect(await passwordLink(secret, "test")).not.toBeNull();
});

test("an unknown address, a deactivated account and a fourth time within an hour get no mail, in the same time", async () => {
  const { askForPassword } = await passwords();
  const mails = async () =>
    (await asOwner<{ count: string }>(database, "select count(*) from mail_outbox"))[0]?.count ?? "";
  await asOwner(database, "update person set active = false where email = 'guest@kestrel-ridge.example'");
  const before = await mails();
  const took = async (email: string) => {
    const begun = performance.now();
    await askForPassword(email, "test");
    return performance.now() - begun;
  };
  const unknown = await took("nobody@kestrel-ridge.example");
  await took("guest@kestrel-ridge.example");
  expect(await mails()).toBe(before);
  const known = await took(TECHNICIAN);
  expect(Math.abs(known - unknown)).toBeLessThan(100);
  for (let times = 0; times < 4; times++) await askForPassword(TECHNICIAN, "test");
  expect(Number(await mails()) - Number(before)).toBe(3);
  await asOwner(database, "update person set active = true where email = 'guest@kestrel-ridge.example'");
});

test("length and the list of common passwords decide, not composition", async () => {
  const { passwordFault } = await import("#app/services/people/password-fault.server.ts");
  const of = (password: string) => passwordFault(password, { email: TECHNICIAN, name: "Jude Okafor" });
  expect(await of("elevenchars")).toMatch(/12 characters/);
  for (const good of ["all small words", "µµµ grün кварц", "correct copper wafer"]) expect(await of(good)).toBeNull();
  for (const guessed of ["qwertyuiop123", "passwordpassword", "Password1Password1", "aaaaaaaaaaaaaa", "123412341234"])
    expect(await of(guessed), guessed).toMatch(/guessed first/);
  for (const own of [TECHNICIAN, "technician@KESTREL-ridge.example", "Jude OkaforJude Okafor"])
    expect(await of(own), own).toMatch(/own address/);
  expect(await of("x".repeat(100) + " y".repeat(60))).toMatch(/under 201/);
});

test("attempts are counted for all processes, and one that succeeds is taken out again", async () => {
  const { countAttempt, forgiveAttempt } = await import("#app/server/rate-limit.server.ts");
  const counted = [["account from address", "a@site.example 127.0.0.1"]] as const;
  const answers = await Promise.all(Array.from({ length: 12 }, () => countAttempt(counted)));
  expect(answers.filter(Boolean)).toHaveLength(10);
  await asOwner(database, "delete from rate_limit");
  for (let times = 0; times < 12; times++) {
    expect(await countAttempt(counted)).toBe(true);
    await forgiveAttempt(counted);
  }
  const [row] = await asOwner<{ key: string }>(database, "select key from rate_limit");
  expect(row?.key).not.toContain("site.example");
});
