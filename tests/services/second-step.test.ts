import { afterEach, beforeAll, beforeEach, expect, test, vi } from "vitest";
import { createDemoAccounts, setDemoPasswords } from "#app/db/seeders/demo-accounts.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { codeIn, codesOn, signedIn } from "./codes-of.ts";

const database = useDatabase({ demo: true });
const accounts = createDemoAccounts();
const half = () => import("#app/services/codes/half-signed-in.server.ts");
const step = () => import("#app/services/codes/second-step.server.ts");
const MINUTE = 60_000;
const ADDRESS = "127.0.0.1";
const sender = { address: ADDRESS, userAgent: "a browser", requestId: "test" };

beforeAll(async () => {
  await setDemoPasswords(database.owner, accounts);
  await Promise.all([half(), step()]);
}, 60_000);

beforeEach(() => asOwner(database, "delete from rate_limit"));

afterEach(() => {
  vi.useRealTimers();
});

async function halfOf(who: string) {
  const codes = await codesOn(database, who);
  const held = await (await half()).halfSignedIn(codes.scope.actor.id, "test");
  if (held === null) throw new Error("was not asked for a code");
  return { ...codes, held, id: codes.scope.actor.id };
}

test("who has no codes is asked for none; who has is signed in by the code, in a new session", async () => {
  const { resumeSession } = await import("#app/services/sessions.server.ts");
  const { halfSignedIn } = await half();
  const { takeSecondStep } = await step();
  const { scope } = await signedIn(database, "technician");
  expect(await halfSignedIn(scope.actor.id, "test")).toBeNull();
  const { held, id, secret, token } = await halfOf("engineer");
  const refused = await takeSecondStep(held, "000 00", sender);
  expect(refused.outcome).toBe("refused");
  const code = codeIn(secret);
  const done = await takeSecondStep(held, code, sender);
  if (done.outcome !== "signed in") throw new Error(done.outcome);
  expect(done.session.token).not.toBe(token);
  expect(await resumeSession(done.session.token, "test")).toMatchObject({ actor: { id }, session: { codes: "on" } });
  // The same once more is refused: the code was used.
  expect((await takeSecondStep(held, code, sender)).outcome).toBe("refused");
  const trail = await asOwner<{ action: string }>(
    database,
    "select action from audit_event where subject = 'session' and subject_id = ? order by at desc limit 3",
    [id],
  );
  expect(trail.map(({ action }) => action)).toEqual(["refused", "signed in", "refused"]);
});

test("the password alone leaves no word of a sign-in in the trail, and being half signed in is no session", async () => {
  const { personWithPassword } = await import("#app/services/sign-in.server.ts");
  const { resumeSession } = await import("#app/services/sessions.server.ts");
  const { held, id } = await halfOf("engineer");
  const account = accounts.find(({ email }) => email.startsWith("engineer@"));
  const signIns = async () =>
    asOwner(
      database,
      "select id from audit_event where subject = 'session' and action = 'signed in' and subject_id = ?",
      [id],
    );
  const before = await signIns();
  expect(await personWithPassword(account?.email ?? "", account?.password ?? "", "test")).toBe(id);
  expect(await signIns()).toHaveLength(before.length);
  expect(await resumeSession(held, "test")).toBeNull();
});

test("what was made up, changed, or made for another counts for nothing", async () => {
  const { whoIsHalfSignedIn } = await half();
  const { held, id } = await halfOf("engineer");
  const other = await halfOf("process-owner");
  const [payload = "", signed = ""] = held.split(".");
  expect(await whoIsHalfSignedIn(held, "test")).toMatchObject({ id });
  const longer = Buffer.from(JSON.stringify({ person: id, until: Date.now() + 60 * MINUTE })).toString("base64url");
  for (const made of [
    "",
    ".",
    payload,
    `${payload}.`,
    `${longer}.${signed}`,
    `${other.held.split(".")[0] ?? ""}.${signed}`,
    "bm90IGpzb24.AAAA",
  ])
    expect(await whoIsHalfSignedIn(made, "test"), made).toBeNull();
});

test("it ends after five minutes, with another password, with the codes, and with the account", async () => {
  const { whoIsHalfSignedIn } = await half();
  const { takeSecondStep } = await step();
  const { held, id, secret } = await halfOf("engineer");
  const good = async () => (await whoIsHalfSignedIn(held, "test")) !== null;
  vi.useFakeTimers({ now: Date.now() + 5 * MINUTE + 1, toFake: ["Date"] });
  expect(await good()).toBe(false);
  expect((await takeSecondStep(held, codeIn(secret), sender)).outcome).toBe("over");
  vi.useRealTimers();
  expect(await good()).toBe(true);
  await asOwner(database, "update person set active = false where id = ?", [id]);
  expect(await good()).toBe(false);
  await asOwner(database, "update person set active = true where id = ?", [id]);
  await asOwner(database, "update one_time_codes set confirmed_at = null where person_id = ?", [id]);
  expect(await good()).toBe(false);
  await asOwner(database, "update one_time_codes set confirmed_at = now() where person_id = ?", [id]);
  expect(await good()).toBe(true);
  await asOwner(database, "update credential set password_hash = password_hash || 'x' where person_id = ?", [id]);
  expect(await good()).toBe(false);
  await setDemoPasswords(database.owner, accounts);
});

test("guesses are limited by account and address, and by account from anywhere, with one and the same answer", async () => {
  const { takeSecondStep } = await step();
  const { held, secret } = await halfOf("engineer");
  for (let times = 0; times < 10; times++)
    expect((await takeSecondStep(held, "000000", sender)).outcome).toBe("refused");
  expect((await takeSecondStep(held, codeIn(secret), sender)).outcome).toBe("too many");
  const elsewhere = { ...sender, address: "192.0.2.7" };
  for (let times = 0; times < 5; times++) await takeSecondStep(held, "000000", elsewhere);
  expect((await takeSecondStep(held, codeIn(secret), elsewhere)).outcome).toBe("too many");
  expect((await takeSecondStep(held, codeIn(secret), { ...sender, address: "192.0.2.8" })).outcome).toBe("too many");
});
