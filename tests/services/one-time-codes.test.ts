import { afterEach, beforeAll, beforeEach, expect, test, vi } from "vitest";
import { createDemoAccounts, setDemoPasswords } from "#app/db/seeders/demo-accounts.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { codeIn, codesOn, signedIn } from "./codes-of.ts";
import { sendWaitingMail } from "./mailed-links.ts";

const database = useDatabase({ demo: true });
const accounts = createDemoAccounts();
const own = () => import("#app/services/codes/own-codes.server.ts");
const MINUTE = 60_000;
const status = (code: number) => ({ init: { status: code } });

beforeAll(async () => {
  await setDemoPasswords(database.owner, accounts);
  await own();
}, 60_000);

beforeEach(() => asOwner(database, "delete from rate_limit"));

afterEach(() => {
  vi.useRealTimers();
});

const passwordOf = (who: string) => accounts.find(({ email }) => email.startsWith(`${who}@`))?.password ?? "";

/** Takes a code at the door, as the second step does. */
async function taken(person: string, code: string): Promise<boolean> {
  const { takeCode } = await import("#app/services/codes/take-code.server.ts");
  const { inScope } = await import("#app/server/scope.server.ts");
  return inScope({ personId: person, atTheDoor: true, requestId: "test" }, (em) => takeCode(em, person, code));
}

const subjects = async () => (await sendWaitingMail(database)).map(({ subject }) => subject);

test("codes count once a first code has shown that the app has the secret; every other session ends and a mail tells", async () => {
  const { beginCodes, confirmCodes, ownCodes } = await own();
  const { resumeSession } = await import("#app/services/sessions.server.ts");
  const there = await signedIn(database, "engineer");
  const { scope, token } = await signedIn(database, "engineer");
  expect(await ownCodes(scope)).toEqual({ since: null, waiting: null, recovery: null });
  await beginCodes(scope);
  const waiting = (await ownCodes(scope)).waiting;
  const secret = waiting?.secret ?? "";
  expect(waiting?.address).toContain(secret.replaceAll(" ", ""));
  expect((await resumeSession(token, "test"))?.session.codes).toBe("off");
  expect(await confirmCodes(scope, "000000")).toHaveProperty("fault");
  const code = codeIn(secret);
  const confirmed = await confirmCodes(scope, code);
  expect(confirmed).toMatchObject({ recovery: { length: 10 } });
  const after = await ownCodes(scope);
  expect(after).toMatchObject({ waiting: null, recovery: { left: 10, usedAt: null } });
  expect(after.since).not.toBeNull();
  expect(await resumeSession(there.token, "test")).toBeNull();
  expect((await resumeSession(token, "test"))?.session.codes).toBe("on");
  expect(await subjects()).toEqual(["Planeward: one-time codes are on"]);
  await expect(beginCodes(scope)).rejects.toMatchObject(status(409));
  // The code that turned them on was used by that.
  expect(await taken(scope.actor.id, code)).toBe(false);
  const trail = await asOwner<{ action: string; field: string | null }>(
    database,
    "select action, field from audit_event where subject = 'one-time codes' and actor_id = ? order by at",
    [scope.actor.id],
  );
  expect(trail).toContainEqual({ action: "created", field: null });
  expect(trail).toContainEqual({ action: "changed", field: "confirmedAt" });
});

test("a secret that no code has confirmed for half an hour is shown and taken no more", async () => {
  const { beginCodes, confirmCodes, ownCodes } = await own();
  const { scope } = await signedIn(database, "technician");
  await beginCodes(scope);
  const secret = (await ownCodes(scope)).waiting?.secret ?? "";
  vi.useFakeTimers({ now: Date.now() + 31 * MINUTE, toFake: ["Date"] });
  expect((await ownCodes(scope)).waiting).toBeNull();
  const later = { ...scope, session: { id: scope.session?.id ?? "", provenAt: Date.now(), codes: "off" as const } };
  await expect(confirmCodes(later, codeIn(secret))).rejects.toMatchObject(status(409));
  vi.useRealTimers();
  const first = (await ownCodes(scope)).waiting?.secret;
  await beginCodes(scope);
  expect((await ownCodes(scope)).waiting?.secret).not.toBe(first);
});

test("without a recent proof nothing is set up", async () => {
  const { beginCodes, renewRecoveryCodes } = await own();
  const { scope } = await signedIn(database, "technician");
  const stale = { ...scope, session: { id: "", provenAt: Date.now() - 11 * MINUTE, codes: "off" as const } };
  for (const each of [stale, { ...scope, session: null }]) {
    await expect(beginCodes(each)).rejects.toMatchObject(status(403));
    await expect(renewRecoveryCodes(each)).rejects.toMatchObject(status(403));
  }
});

test("a code counts once, also for two who come with it at once, and a clock may be a step off", async () => {
  const { scope, secret } = await codesOn(database, "engineer");
  const { id } = scope.actor;
  const now = codeIn(secret);
  const both = await Promise.all([taken(id, now), taken(id, now)]);
  expect(both.toSorted()).toEqual([false, true]);
  expect(await taken(id, codeIn(secret, -1))).toBe(false);
  expect(await taken(id, codeIn(secret, 1))).toBe(true);
  expect(await taken(id, codeIn(secret, 1))).toBe(false);
  vi.useFakeTimers({ now: Date.now() + 5 * MINUTE, toFake: ["Date"] });
  expect(await taken(id, codeIn(secret, -2))).toBe(false);
  expect(await taken(id, `${codeIn(secret).slice(0, 3)} ${codeIn(secret).slice(3)}`)).toBe(true);
});

test("a recovery code counts once however it is typed, and its use is mailed; new ones end those before", async () => {
  const { ownCodes, renewRecoveryCodes } = await own();
  const { scope, recovery } = await codesOn(database, "process-owner");
  const { id } = scope.actor;
  const [first = "", second = "", third = ""] = recovery;
  expect(new Set(recovery).size).toBe(10);
  expect(first).toMatch(/^([a-z2-7]{4}-){5}[a-z2-7]{4}$/);
  await sendWaitingMail(database);
  expect((await Promise.all([taken(id, first), taken(id, first)])).toSorted()).toEqual([false, true]);
  expect(await taken(id, second.toUpperCase().replaceAll("-", " "))).toBe(true);
  expect(await subjects()).toEqual(Array.from({ length: 2 }, () => "Planeward: a recovery code was used"));
  expect((await ownCodes(scope)).recovery?.left).toBe(8);
  const renewed = await renewRecoveryCodes(scope);
  expect(await taken(id, third)).toBe(false);
  expect(await taken(id, renewed[0] ?? "")).toBe(true);
  expect(await subjects()).toEqual(["Planeward: new recovery codes", "Planeward: a recovery code was used"]);
});

test("neither the secret nor a recovery code stands in the database, and a row of somebody else's opens nothing", async () => {
  const { scope, secret, recovery } = await codesOn(database, "engineer");
  const other = await codesOn(database, "process-owner");
  for (const table of ["one_time_codes", "audit_event", "mail_outbox"]) {
    const rows = await asOwner<{ row: string }>(database, `select t::text as row from ${table} t`);
    for (const { row } of rows)
      for (const hidden of [
        secret.replaceAll(" ", ""),
        ...recovery,
        ...recovery.map((code) => code.replaceAll("-", "")),
      ])
        expect(row).not.toContain(hidden);
  }
  await asOwner(
    database,
    `update one_time_codes set secret_sealed = (select secret_sealed from one_time_codes where person_id = ?) where person_id = ?`,
    [scope.actor.id, other.scope.actor.id],
  );
  expect(await taken(other.scope.actor.id, codeIn(secret))).toBe(false);
  expect(await taken(other.scope.actor.id, other.recovery[0] ?? "")).toBe(true);
});

test("they are turned off by password and code alone, and asked for at every later proof before that", async () => {
  const { ownCodes, turnCodesOff } = await own();
  const { proofAsked, proveAgain } = await import("#app/services/people/recent-proof.server.ts");
  const { scope, secret, recovery } = await codesOn(database, "engineer");
  const password = passwordOf("engineer");
  const id = scope.session?.id ?? "";
  const stale = { ...scope, session: { id, provenAt: Date.now() - 11 * MINUTE, codes: "on" as const } };
  expect(proofAsked(scope)).toBeNull();
  expect(proofAsked(stale)).toBe("password and code");
  expect((await proveAgain(stale, { proof: password, proofCode: "" })).fault).toMatchObject({ field: "proofCode" });
  expect((await proveAgain(stale, { proof: password, proofCode: "123" })).fault).toMatchObject({ field: "proofCode" });
  expect((await proveAgain(stale, { proof: "not it", proofCode: codeIn(secret) })).fault?.field).toBe("proof");
  // The wrong password has not used the code up.
  const code = codeIn(secret);
  expect((await proveAgain(stale, { proof: password, proofCode: code })).fault).toBeNull();
  expect(await turnCodesOff(scope, { proof: password, proofCode: code })).toMatchObject({
    field: "proofCode",
  });
  expect(await turnCodesOff(scope, { proof: "not it", proofCode: recovery[0] ?? "" })).toMatchObject({
    field: "proof",
  });
  expect(await turnCodesOff(scope, { proof: password, proofCode: recovery[0] ?? "" })).toBeNull();
  expect((await ownCodes(scope)).since).toBeNull();
  expect(await subjects()).toContain("Planeward: one-time codes are off");
  await expect(turnCodesOff({ ...scope, session: null }, { proof: password, proofCode: "" })).rejects.toMatchObject(
    status(403),
  );
});

test("guesses at a code are limited, and the right one does not count then either", async () => {
  const { turnCodesOff } = await own();
  const { scope, secret } = await codesOn(database, "engineer");
  const password = passwordOf("engineer");
  for (let times = 0; times < 15; times++) await turnCodesOff(scope, { proof: password, proofCode: "000 000" });
  expect(await turnCodesOff(scope, { proof: password, proofCode: codeIn(secret) })).toMatchObject({
    field: "proofCode",
    sentence: expect.stringMatching(/^Too many attempts/),
  });
});

test("nobody sees or writes another's codes but an administrator, who takes them away", async () => {
  const { inScope } = await import("#app/server/scope.server.ts");
  const { scope } = await codesOn(database, "engineer");
  const { id } = scope.actor;
  const technician = (await signedIn(database, "technician")).scope;
  const administrator = (await signedIn(database, "administrator")).scope;
  const rows = (of: typeof scope) =>
    inScope(of, (em) => em.execute<unknown[]>("select id from one_time_codes where person_id = ?", [id]));
  expect(await rows(technician)).toEqual([]);
  expect(await rows(administrator)).toHaveLength(1);
  for (const of of [technician, administrator])
    await inScope(of, (em) => em.execute("update one_time_codes set confirmed_at = null where person_id = ?", [id]));
  await inScope(technician, (em) => em.execute("delete from one_time_codes where person_id = ?", [id]));
  const [row] = await asOwner<{ confirmed_at: Date | null }>(
    database,
    "select confirmed_at from one_time_codes where person_id = ?",
    [id],
  );
  expect(row?.confirmed_at).not.toBeNull();
});
