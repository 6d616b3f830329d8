import { afterEach, beforeAll, beforeEach, expect, test, vi } from "vitest";
import { createDemoAccounts, setDemoPasswords } from "#app/db/seeders/demo-accounts.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { signedIn } from "./codes-of.ts";
import { secretIn, sendWaitingMail } from "./mailed-links.ts";

const database = useDatabase({ demo: true });
const accounts = createDemoAccounts();
const change = () => import("#app/services/people/change-address.server.ts");
const status = (code: number) => ({ init: { status: code } });
const emailOf = async (id: string) =>
  (await asOwner<{ email: string }>(database, "select email from person where id = ?", [id]))[0]?.email;

beforeAll(async () => {
  await setDemoPasswords(database.owner, accounts);
  await change();
}, 60_000);

beforeEach(() => asOwner(database, "delete from rate_limit"));

afterEach(async () => {
  vi.useRealTimers();
  await sendWaitingMail(database);
});

test("the new address gets a link, which changes it once; the one before is told, and signs in no more", async () => {
  const { addressLink, askForAddress, confirmAddress } = await change();
  const { personWithPassword } = await import("#app/services/sign-in.server.ts");
  const { scope } = await signedIn(database, "engineer");
  const { id, email, name } = scope.actor;
  const fresh = "i.engineer@kestrel-ridge.example";
  await askForAddress(scope, fresh);
  expect(await emailOf(id)).toBe(email);
  const [mail] = await sendWaitingMail(database);
  expect(mail).toMatchObject({ to: { address: fresh }, subject: "Planeward: confirm your new address" });
  const secret = secretIn(mail);
  // Looking uses nothing up.
  for (let looks = 0; looks < 2; looks++) expect(await addressLink(secret, "test")).toEqual({ name, address: fresh });
  const both = await Promise.all([confirmAddress(secret, "test"), confirmAddress(secret, "test")]);
  expect(both.toSorted()).toEqual([false, true]);
  expect(await emailOf(id)).toBe(fresh);
  const notices = await sendWaitingMail(database);
  expect(notices).toMatchObject([{ to: { address: email }, subject: "Planeward: your address was changed" }]);
  const password = accounts.find((account) => account.email === email)?.password ?? "";
  expect(await personWithPassword(email, password, "test")).toBeNull();
  expect(await personWithPassword(fresh, password, "test")).toBe(id);
  const trail = await asOwner<{ from: string; to: string }>(
    database,
    `select "from", "to" from audit_event where subject = 'person' and field = 'email' and subject_id = ?`,
    [id],
  );
  expect(trail).toEqual([{ from: email, to: fresh }]);
  await asOwner(database, "update person set email = ? where id = ?", [email, id]);
});

test("an address that is somebody's gets nothing and the answer is the same, in the same time", async () => {
  const { askForAddress } = await change();
  const { scope } = await signedIn(database, "engineer");
  const took = async (address: string) => {
    const begun = performance.now();
    expect(await askForAddress(scope, address)).toBeUndefined();
    return performance.now() - begun;
  };
  await took("first@kestrel-ridge.example");
  await sendWaitingMail(database);
  const takenTime = await took("guest@kestrel-ridge.example");
  expect(await sendWaitingMail(database)).toEqual([]);
  const freeTime = await took("free@kestrel-ridge.example");
  expect(await sendWaitingMail(database)).toHaveLength(1);
  expect(Math.abs(takenTime - freeTime)).toBeLessThan(150);
  // A fourth within the hour is passed over.
  await took("fourth@kestrel-ridge.example");
  expect(await sendWaitingMail(database)).toEqual([]);
});

test("a link ends with a newer one, with a new password, after a day, and when the address has become somebody's", async () => {
  const { addressLink, askForAddress, confirmAddress } = await change();
  const { endTokens } = await import("#app/services/people/tokens.server.ts");
  const { inScope } = await import("#app/server/scope.server.ts");
  const { scope } = await signedIn(database, "technician");
  const link = async (address: string) => {
    await asOwner(database, "delete from rate_limit");
    await askForAddress(scope, address);
    return secretIn((await sendWaitingMail(database)).at(-1));
  };
  const first = await link("one@kestrel-ridge.example");
  const second = await link("two@kestrel-ridge.example");
  expect(await addressLink(first, "test")).toBeNull();
  expect(await confirmAddress(first, "test")).toBe(false);
  await inScope({ personId: null, atTheDoor: true, requestId: "test" }, (em) => endTokens(em, scope.actor.id));
  expect(await confirmAddress(second, "test")).toBe(false);
  const third = await link("three@kestrel-ridge.example");
  vi.useFakeTimers({ now: Date.now() + 24 * 3600e3 + 1000, toFake: ["Date"] });
  expect(await addressLink(third, "test")).toBeNull();
  expect(await confirmAddress(third, "test")).toBe(false);
  vi.useRealTimers();
  await asOwner(database, "update person set email = 'three@kestrel-ridge.example' where email like 'guest@%'");
  expect(await addressLink(third, "test")).not.toBeNull();
  expect(await confirmAddress(third, "test")).toBe(false);
  expect(await emailOf(scope.actor.id)).toBe(scope.actor.email);
});

test("a link of another kind confirms no address, and without a recent proof none is asked for", async () => {
  const { askForAddress, confirmAddress } = await change();
  const { askForPassword, passwordLink } = await import("#app/services/people/set-password.server.ts");
  const { scope } = await signedIn(database, "technician");
  await askForPassword(scope.actor.email, "test");
  const secret = secretIn((await sendWaitingMail(database)).at(-1));
  expect(await confirmAddress(secret, "test")).toBe(false);
  expect(await passwordLink(secret, "test")).not.toBeNull();
  const stale = { ...scope, session: { id: "", provenAt: Date.now() - 11 * 60_000, codes: "off" as const } };
  for (const each of [stale, { ...scope, session: null }])
    await expect(askForAddress(each, "x@kestrel-ridge.example")).rejects.toMatchObject(status(403));
});
