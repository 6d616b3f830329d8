import { beforeAll, expect, test } from "vitest";
import { createDemoAccounts, setDemoPasswords } from "#app/db/seeders/demo-accounts.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const accounts = createDemoAccounts();
const proofs = () => import("#app/services/people/recent-proof.server.ts");
const MINUTE = 60_000;

let owner: ActorScope;
let password: string;
let token: string;

beforeAll(async () => {
  await setDemoPasswords(database.owner, accounts);
  await proofs();
  const { startSession, resumeSession } = await import("#app/services/sessions.server.ts");
  const known = await scopeOfPerson(database, "process-owner");
  password = accounts.find(({ email }) => email === known.actor.email)?.password ?? "";
  ({ token } = await startSession(known.actor.id, "a browser", "test"));
  owner = { ...known, session: (await resumeSession(token, "test"))?.session ?? null };
}, 60_000);

/** The same session as if its last proof were as old. */
const provenBefore = (milliseconds: number): ActorScope => ({
  ...owner,
  session: { id: owner.session?.id ?? "", provenAt: Date.now() - milliseconds, codes: "off" },
});

const given = (proof: string) => ({ proof, proofCode: "" });

test("signing in is a proof for ten minutes, and without a session there is none", async () => {
  const { requireRecentProof } = await proofs();
  requireRecentProof(owner);
  requireRecentProof(provenBefore(9 * MINUTE));
  for (const scope of [provenBefore(10 * MINUTE), { ...owner, session: null }])
    expect(() => requireRecentProof(scope)).toThrow(expect.objectContaining({ init: { status: 403 } }));
});

test("afterwards the password proves it, and is noted in the session; a wrong one is told at its field", async () => {
  const { proveAgain, requireRecentProof } = await proofs();
  const old = provenBefore(20 * MINUTE);
  await asOwner(database, "update session set proven_at = now() - interval '20 minutes'");
  expect((await proveAgain(old, given(""))).fault?.sentence).toMatch(/^Type your password/);
  expect((await proveAgain(old, given("not it"))).fault).toMatchObject({
    field: "proof",
    sentence: expect.stringMatching(/^This is not your password/),
  });
  const proven = await proveAgain(old, given(password));
  if (proven.scope === null) throw new Error(proven.fault.sentence);
  requireRecentProof(proven.scope);
  const [row] = await asOwner<{ lately: boolean }>(
    database,
    "select proven_at > now() - interval '1 minute' as lately from session",
  );
  expect(row?.lately).toBe(true);
  const { resumeSession } = await import("#app/services/sessions.server.ts");
  const next = (await resumeSession(token, "test"))?.renewed?.token ?? "";
  expect(next).not.toBe("");
  await asOwner(database, "update session set rotated_at = now() - interval '2 minutes'");
  expect(await resumeSession(token, "test"), "the token of before the proof").toBeNull();
  expect(await resumeSession(next, "test")).not.toBeNull();
});

test("guesses are limited, and the right password does not count then either", async () => {
  const { proveAgain } = await proofs();
  const old = provenBefore(20 * MINUTE);
  for (let times = 0; times < 12; times++) await proveAgain(old, given("not it"));
  expect((await proveAgain(old, given(password))).fault?.sentence).toMatch(/^Too many attempts/);
});

test("a sheet is released by nobody whose last proof is older", async () => {
  const { releaseRevision } = await import("#app/services/sheets/release.server.ts");
  await expect(
    releaseRevision(
      provenBefore(11 * MINUTE),
      "5f0c2f6e-7f0a-4c58-9a47-51d0a3f5b001",
      "",
      "https://planeward.site.example",
    ),
  ).rejects.toMatchObject({ init: { status: 403 } });
});
