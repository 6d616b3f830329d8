import { RouterContextProvider } from "react-router";
import { afterEach, beforeAll, beforeEach, expect, test } from "vitest";
import { createDemoAccounts, setDemoPasswords } from "#app/db/seeders/demo-accounts.ts";
import type { Role } from "#app/policies/roles.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { codeIn, codesOn, signedIn } from "./codes-of.ts";
import { sendWaitingMail } from "./mailed-links.ts";

const database = useDatabase({ demo: true });
const required = () => import("#app/services/codes/required-codes.server.ts");
const status = (code: number) => ({ init: { status: code } });

let administrator: ActorScope;

beforeAll(async () => {
  await setDemoPasswords(database.owner, createDemoAccounts());
  await Promise.all([required(), import("#app/middleware/session.server.ts")]);
  administrator = (await signedIn(database, "administrator")).scope;
}, 60_000);

beforeEach(() => asOwner(database, "delete from rate_limit"));
afterEach(() => asOwner(database, "update site_setting set codes_for = '{}'"));

const stateOf = async (who: string) => (await signedIn(database, who)).scope.session?.codes;
const ask = async (...roles: Role[]) => (await required()).saveCodesRequired(administrator, roles);

test("nobody has to have codes as delivered; then whoever holds a role that has to, in any program or on the site", async () => {
  const { codesRequiredFor } = await required();
  expect(await codesRequiredFor(administrator)).toEqual([]);
  for (const who of ["engineer", "process-owner", "administrator", "shift-lead", "guest"])
    expect(await stateOf(who), who).toBe("off");
  await ask("process owner", "administrator", "process owner");
  expect(await codesRequiredFor(administrator)).toEqual(["administrator", "process owner"]);
  expect(await stateOf("process-owner")).toBe("missing");
  expect(await stateOf("administrator")).toBe("missing");
  expect(await stateOf("engineer")).toBe("off");
  const { token } = await codesOn(database, "process-owner");
  const { resumeSession } = await import("#app/services/sessions.server.ts");
  expect((await resumeSession(token, "test"))?.session.codes).toBe("on");
  const [event] = await asOwner<{ field: string; to: unknown }>(
    database,
    `select field, "to" from audit_event where subject = 'site setting' order by at desc limit 1`,
  );
  expect(event?.field).toBe("codesFor");
  expect(JSON.stringify(event?.to)).toContain("process owner");
});

test("who stands in for a process owner acts as one, and needs codes as one does", async () => {
  const { needsCodes } = await import("#app/policies/codes.ts");
  const { actor } = (await signedIn(database, "engineer")).scope;
  expect(needsCodes(actor, ["process owner"])).toBe(false);
  const memberships = actor.memberships.map((each, index) =>
    index === 0 ? { ...each, standsInFor: [{ id: administrator.actor.id, name: "Somebody" }] } : each,
  );
  expect(needsCodes({ ...actor, memberships }, ["process owner"])).toBe(true);
  expect(needsCodes({ ...actor, memberships }, ["guest", "administrator", "shift lead"])).toBe(false);
});

/** What the pages behind the door are told of a request with a session, and where it is sent. */
async function requestOf(token: string) {
  const { session } = await import("#app/middleware/session.server.ts");
  const { signedIn: door } = await import("#app/middleware/signed-in.server.ts");
  const { actorContext, heldContext, sessionContext } = await import("#app/server/contexts.server.ts");
  const { sessionCookie } = await import("#app/server/session-cookie.server.ts");
  const url = new URL("http://127.0.0.1/films?sort=name");
  const cookie = await sessionCookie(new Request(url), { token, expiresAt: new Date(Date.now() + 60_000) });
  const request = new Request(url, { headers: { Cookie: cookie.split(";")[0] ?? "" } });
  const context = new RouterContextProvider();
  const args = { request, context, url, params: {}, pattern: "/films" } as unknown as Parameters<typeof door>[0];
  let location: string | null = null;
  await session(args, async () => {
    const answer: unknown = await Promise.resolve(door(args, () => Promise.resolve(new Response()))).catch(
      (thrown: unknown) => thrown,
    );
    location = answer instanceof Response ? answer.headers.get("Location") : "?";
    return new Response();
  });
  return {
    location,
    actor: context.get(actorContext),
    session: context.get(sessionContext),
    held: context.get(heldContext),
  };
}

test("who has to and has none is nobody to every page but the one that sets codes up", async () => {
  const { token, scope } = await signedIn(database, "engineer");
  expect(await requestOf(token)).toMatchObject({ location: null, actor: { id: scope.actor.id }, held: null });
  await ask("engineer");
  expect(await requestOf(token)).toMatchObject({
    location: "/sign-in/set-up?next=%2Ffilms%3Fsort%3Dname",
    actor: null,
    session: null,
    held: { actor: { id: scope.actor.id } },
  });
  const { makeToken } = await import("#app/services/api/tokens.server.ts");
  const { scope: held } = await signedIn(database, "engineer");
  const [program] = held.actor.memberships;
  await expect(
    makeToken(held, {
      intent: "make",
      name: "a gauge",
      program: program?.programId ?? "",
      scopes: ["films:read"],
      days: 7,
    }),
  ).rejects.toMatchObject(status(403));
  const after = await codesOn(database, "engineer");
  expect(await requestOf(after.token)).toMatchObject({ location: null, actor: { id: scope.actor.id }, held: null });
});

test("only an administrator says who has to, having proved lately who they are", async () => {
  const { codesRequiredFor, saveCodesRequired } = await required();
  const { scope } = await signedIn(database, "process-owner");
  await expect(codesRequiredFor(scope)).rejects.toMatchObject(status(403));
  await expect(saveCodesRequired(scope, [])).rejects.toMatchObject(status(403));
  const stale = { ...administrator, session: { id: "", provenAt: Date.now() - 11 * 60_000, codes: "off" as const } };
  await expect(saveCodesRequired(stale, ["guest"])).rejects.toMatchObject(status(403));
});

test("an administrator resets another's codes: their sessions end, the password signs in again, mail and trail tell", async () => {
  const { resetCodes } = await import("#app/services/people/manage-people.server.ts");
  const { personPage } = await import("#app/services/people/list-people.server.ts");
  const { halfSignedIn } = await import("#app/services/codes/half-signed-in.server.ts");
  const { resumeSession } = await import("#app/services/sessions.server.ts");
  const { scope, token } = await codesOn(database, "shift-lead");
  const { id } = scope.actor;
  expect((await personPage(administrator, id)).codesSince).not.toBeNull();
  const owner = (await signedIn(database, "process-owner")).scope;
  await expect(resetCodes(owner, id)).rejects.toMatchObject(status(403));
  const stale = { ...administrator, session: { id: "", provenAt: Date.now() - 11 * 60_000, codes: "off" as const } };
  await expect(resetCodes(stale, id)).rejects.toMatchObject(status(403));
  await sendWaitingMail(database);
  await resetCodes(administrator, id);
  expect(await halfSignedIn(id, "test")).toBeNull();
  expect(await resumeSession(token, "test")).toBeNull();
  expect((await personPage(administrator, id)).codesSince).toBeNull();
  const mails = await sendWaitingMail(database);
  expect(mails).toMatchObject([
    { to: { address: scope.actor.email }, subject: "Planeward: your one-time codes were reset" },
  ]);
  const trail = await asOwner<{ action: string }>(
    database,
    "select action from audit_event where subject = 'one-time codes' and actor_id = ?",
    [administrator.actor.id],
  );
  expect(trail).toEqual([{ action: "removed" }]);
  await expect(resetCodes(administrator, id)).rejects.toMatchObject(status(409));
  await expect(resetCodes(administrator, administrator.actor.id)).rejects.toMatchObject(status(409));
});

test("setting them up ends the session that could do nothing else and begins another, and shows the recovery codes once", async () => {
  const { action, loader } = await import("#app/routes/_auth/set-up-codes.tsx");
  const { heldContext } = await import("#app/server/contexts.server.ts");
  const { sessionCookie, tokenOf } = await import("#app/server/session-cookie.server.ts");
  const { resumeSession } = await import("#app/services/sessions.server.ts");
  await ask("technician");
  const { scope, token } = await signedIn(database, "technician");
  if (!scope.session) throw new Error("no session");
  const context = new RouterContextProvider();
  context.set(heldContext, { actor: scope.actor, session: scope.session });
  const url = new URL("http://127.0.0.1/sign-in/set-up?next=%2Ffloor");
  const cookie = await sessionCookie(new Request(url), { token, expiresAt: new Date(Date.now() + 60_000) });
  const send = async (form: Record<string, string>) => {
    const headers = { Cookie: cookie.split(";")[0] ?? "" };
    const request = new Request(url, { method: "POST", body: new URLSearchParams(form), headers });
    return action({ request, context, url, params: {} } as unknown as Parameters<typeof action>[0]);
  };
  const look = () => loader({ context, url } as unknown as Parameters<typeof loader>[0]);
  expect(await look()).toMatchObject({ waiting: null, next: "/floor" });
  await expect(send({ intent: "begin" })).rejects.toMatchObject({ status: 302 });
  const secret = (await look()).waiting?.secret ?? "";
  expect(await send({ intent: "confirm", code: "12" })).toMatchObject({
    data: { recovery: null },
    init: { status: 400 },
  });
  const done = await send({ intent: "confirm", code: codeIn(secret) });
  expect(done.data).toMatchObject({ recovery: { length: 10 } });
  const set = new Headers(done.init?.headers).get("Set-Cookie") ?? "";
  const next = await tokenOf(new Request(url, { headers: { Cookie: set.split(";")[0] ?? "" } }));
  expect(await resumeSession(token, "test")).toBeNull();
  expect((await resumeSession(next ?? "", "test"))?.session.codes).toBe("on");
});
