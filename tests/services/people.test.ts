import { randomUUID } from "node:crypto";
import { beforeAll, beforeEach, expect, test } from "vitest";
import { createDemoAccounts, setDemoPasswords } from "#app/db/seeders/demo-accounts.ts";
import { readListParams } from "#app/lib/list-params.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { secretIn, sendWaitingMail } from "./mailed-links.ts";

const database = useDatabase({ demo: true });
const managing = () => import("#app/services/people/manage-people.server.ts");
const listing = () => import("#app/services/people/list-people.server.ts");

let administrator: ActorScope;
let tern: string;

beforeAll(async () => {
  await setDemoPasswords(database.owner, createDemoAccounts());
  await Promise.all([managing(), listing(), import("#app/services/people/set-password.server.ts")]);
  administrator = await scopeOfPerson(database, "administrator");
  tern = (await asOwner<{ id: string }>(database, "select id from program where slug = 'tern'"))[0]?.id ?? "";
}, 60_000);

beforeEach(() => asOwner(database, "delete from rate_limit"));

const status = (code: number) => ({ init: { status: code } });
const idOf = async (account: string) => (await scopeOfPerson(database, account)).actor.id;

test("somebody invited is not active until they set a password, has their roles then, and signs in", async () => {
  const { invitePerson } = await managing();
  const { setPasswordByLink } = await import("#app/services/people/set-password.server.ts");
  const { personWithPassword } = await import("#app/services/sign-in.server.ts");
  const invited = {
    name: "Noor Haddad",
    email: "noor@kestrel-ridge.example",
    siteRole: null,
    memberships: [{ program: tern, role: "technician" as const }],
  };
  const id = await invitePerson(administrator, invited);
  expect(await invitePerson(administrator, invited)).toBeNull();
  const list = async (search: string) =>
    (await listing()).listPeople(
      administrator,
      readListParams(new URLSearchParams(search), { sorts: ["name"], filters: ["state"] }),
    );
  const found = await list("q=noor&state=invited");
  expect(found.rows).toMatchObject([
    { id, state: "invited", lastSignInAt: null, memberships: [{ program: "Tern", role: "technician" }] },
  ]);
  const [mail] = await sendWaitingMail(database);
  expect(mail).toMatchObject({
    to: { address: invited.email },
    subject: "Planeward: your invitation",
    unsubscribe: null,
  });
  expect(await setPasswordByLink(secretIn(mail), "a fine long password", "test")).toEqual({ outcome: "set" });
  expect(await personWithPassword(invited.email, "a fine long password", "test")).toBe(id);
  expect((await list("q=noor&state=active")).total).toBe(1);
  const trail = await asOwner<{ subject: string }>(
    database,
    "select subject from audit_event where actor_id = ? and action = 'created'",
    [administrator.actor.id],
  );
  expect(trail.map(({ subject }) => subject)).toEqual(expect.arrayContaining(["person", "membership"]));
});

test("an invitation that is sent again ends the one before", async () => {
  const { inviteAgain, invitePerson } = await managing();
  const { passwordLink } = await import("#app/services/people/set-password.server.ts");
  const id = await invitePerson(administrator, {
    name: "Ivo",
    email: "ivo@kestrel-ridge.example",
    siteRole: null,
    memberships: [],
  });
  const first = secretIn((await sendWaitingMail(database))[0]);
  await inviteAgain(administrator, id ?? "");
  const second = secretIn((await sendWaitingMail(database))[0]);
  expect(await passwordLink(first, "test")).toBeNull();
  expect(await passwordLink(second, "test")).toMatchObject({ isFirst: true });
  await expect(inviteAgain(administrator, await idOf("guest"))).rejects.toMatchObject(status(409));
});

test("whoever has lost a device is signed out everywhere, by an administrator who has proved themselves", async () => {
  const { signOutEverywhere } = await managing();
  const { startSession, resumeSession } = await import("#app/services/sessions.server.ts");
  const id = await idOf("guest");
  const { token } = await startSession(id, "a lost tablet", "test");
  const left = { ...administrator, session: { id: randomUUID(), provenAt: 0, codes: "off" as const } };
  await expect(signOutEverywhere(left, id)).rejects.toMatchObject(status(403));
  await expect(signOutEverywhere(administrator, administrator.actor.id)).rejects.toMatchObject(status(409));
  expect(await resumeSession(token, "test")).not.toBeNull();
  await signOutEverywhere(administrator, id);
  expect(await resumeSession(token, "test")).toBeNull();
  const trail = await asOwner(
    database,
    "select 1 from audit_event where action = 'signed out' and actor_id = ? and subject_id = ?",
    [administrator.actor.id, id],
  );
  expect(trail).toHaveLength(1);
  expect(await startSession(id, "a new one", "test")).toHaveProperty("token");
});

test("whoever is deactivated is out at once, and comes back by a new password", async () => {
  const { deactivatePerson, reactivatePerson } = await managing();
  const { startSession, resumeSession } = await import("#app/services/sessions.server.ts");
  const { setPasswordByLink } = await import("#app/services/people/set-password.server.ts");
  const id = await idOf("technician");
  const { token } = await startSession(id, "a browser", "test");
  await deactivatePerson(administrator, id);
  expect(await resumeSession(token, "test")).toBeNull();
  expect(await asOwner(database, "select id from session where person_id = ?", [id])).toEqual([]);
  await reactivatePerson(administrator, id);
  const secret = secretIn((await sendWaitingMail(database)).at(-1));
  expect(await setPasswordByLink(secret, "another fine password", "test")).toEqual({ outcome: "set" });
  const [row] = await asOwner<{ active: boolean }>(database, "select active from person where id = ?", [id]);
  expect(row?.active).toBe(true);
});

test("nobody changes their own roles, and the last administrator stays", async () => {
  const { changeRoles, deactivatePerson } = await managing();
  const own = administrator.actor.id;
  const none = { siteRole: null, memberships: [] };
  await expect(changeRoles(administrator, own, none)).rejects.toMatchObject(status(409));
  await expect(deactivatePerson(administrator, own)).rejects.toMatchObject(status(409));
  const second = await scopeOfPerson(database, "engineer");
  await changeRoles(administrator, second.actor.id, { siteRole: "administrator", memberships: [] });
  const promoted = await scopeOfPerson(database, "engineer");
  // Each takes the role from the other at once: one is too late.
  const outcomes = await Promise.allSettled([
    changeRoles(administrator, promoted.actor.id, none),
    changeRoles(promoted, own, none),
  ]);
  expect(outcomes.filter(({ status: how }) => how === "fulfilled")).toHaveLength(1);
  const left = await asOwner(database, "select id from person where active and site_role = 'administrator'");
  expect(left).toHaveLength(1);
  await asOwner(
    database,
    "update person set site_role = case when id = ? then 'administrator' end where id in (?, ?)",
    [own, own, promoted.actor.id],
  );
});

test("everybody else is refused, by the services and by the database", async () => {
  const { deactivatePerson, invitePerson } = await managing();
  const { inScope } = await import("#app/server/scope.server.ts");
  const owner = await scopeOfPerson(database, "process-owner");
  const guest = await idOf("guest");
  await expect(deactivatePerson(owner, guest)).rejects.toMatchObject(status(403));
  await expect(
    invitePerson(owner, { name: "X", email: "x@kestrel-ridge.example", siteRole: null, memberships: [] }),
  ).rejects.toMatchObject(status(403));
  await expect(
    inScope(owner, (em) => em.execute("update person set site_role = 'administrator' where id = ?", [owner.actor.id])),
  ).rejects.toThrow(/only an administrator/);
  await expect(inScope(owner, (em) => em.execute("select end_sessions_of(?)", [guest]))).rejects.toThrow(
    /only an admin/,
  );
  await inScope(owner, (em) => em.execute("update person set active = false where id = ?", [guest]));
  const [row] = await asOwner<{ active: boolean }>(database, "select active from person where id = ?", [guest]);
  expect(row?.active).toBe(true);
  const stale = { ...administrator, session: { id: guest, provenAt: Date.now() - 11 * 60_000, codes: "off" as const } };
  await expect(
    invitePerson(stale, { name: "X", email: "x@kestrel-ridge.example", siteRole: null, memberships: [] }),
  ).rejects.toMatchObject(status(403));
});
