import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const sweeps = () => import("#app/services/stack-sweep/sweep.server.ts");
const files = () => import("#app/services/stack-sweep/files.server.tsx");

const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;
const NOWHERE = "00000000-0000-4000-8000-000000000000";

let engineer: ActorScope;
/** Belongs to Tern and Petrel, not to Fulmar. */
let technician: ActorScope;
let guest: ActorScope;
let administrator: ActorScope;
let ids: Record<string, string> = {};

const ask = (asked: Record<string, string> = {}) => new URLSearchParams(asked);
const idOf = (slug: string) => ids[slug] ?? "";

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([sweeps(), files()]);
  engineer = await scopeOfPerson(database, "engineer");
  await leave(database, "technician", "fulmar");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  administrator = await scopeOfPerson(database, "administrator");
  const rows = await asOwner<{ slug: string; id: string }>(
    database,
    "select p.slug, s.id from stack s join program p on p.id = s.program_id",
  );
  ids = Object.fromEntries(rows.map(({ slug, id }) => [slug, id]));
}, 90_000);

test("nothing asked is the warp against silicon, with the strictest tool's limits", async () => {
  const { stackSweep } = await sweeps();
  const { swept, inputs, limits } = await stackSweep(technician, idOf("petrel"), ask());
  expect(swept?.drawn).toMatchObject({ kind: "curve", x: { label: "Silicon thickness" } });
  expect(swept?.crossings[0]).toMatch(/^The warp reaches .* of silicon\. Below that it is more\.$/u);
  expect(limits.length).toBeGreaterThan(2);
  const films = inputs.filter(({ label }) => label.includes(": stress at its reference"));
  expect(new Set(films.map(({ value }) => value)).size).toBe(films.length);
  expect(films.length).toBeGreaterThan(3);
});

test("two inputs are a map of 41 by 41, the answer of the stack itself on it", async () => {
  const { stackSweep } = await sweeps();
  const asked = { x: "silicon", y: "temperature", answer: "load", "y-from": "0 C", "y-to": "200 C" };
  const { swept } = await stackSweep(engineer, idOf("tern"), ask(asked));
  if (swept?.drawn.kind !== "map") throw new Error("no map");
  expect(swept.drawn.values).toHaveLength(41 * 41);
  expect(swept.drawn.states).toHaveLength(41 * 41);
  expect(swept.drawn.own?.value).toBeGreaterThan(0);
  expect(swept.drawn.levels.some(({ limit }) => limit !== null)).toBe(true);
});

test("a foreign stack, one that is not there and one that is no id are alike no such stack", async () => {
  const { stackSweep, sweptStack } = await sweeps();
  for (const id of [idOf("fulmar"), NOWHERE, "1' or '1'='1", undefined]) {
    await expect(stackSweep(technician, id, ask())).rejects.toEqual(status(404));
    await expect(sweptStack(technician, id, ask())).rejects.toEqual(status(404));
  }
  for (const scope of [guest, administrator])
    await expect(stackSweep(scope, idOf("tern"), ask())).rejects.toEqual(status(404));
});

test.each([
  [{ x: "front gone 1 stress" }, { x: { input: expect.stringContaining("taken out") as string } }],
  [{ x: "silicon", y: "silicon" }, { y: { input: expect.stringContaining("the same input") as string } }],
  [{ "x-from": "700 um", "x-to": "50 um" }, { x: { to: expect.stringContaining("empty") as string } }],
  [{ "x-from": "3 kg" }, { x: { from: expect.stringContaining("mass") as string } }],
  [{ answer: "beauty" }, { answer: expect.stringContaining("no such answer") as string }],
  [{ own: "2 MPa" }, { own: expect.stringContaining("MPa") as string }],
  [{ at: "12 parsecs" }, { at: expect.stringContaining("parsecs") as string }],
  [{ limit: NOWHERE }, { limit: expect.stringContaining("any more") as string }],
])("%o is refused at its field, and kept as it was typed", async (asked, faults) => {
  const { stackSweep, sweptStack } = await sweeps();
  const view = await stackSweep(engineer, idOf("tern"), ask(asked));
  expect(view.swept).toBeNull();
  expect(view.faults).toMatchObject(faults);
  if ("x-from" in asked) expect(view.asked.x.from).toBe(asked["x-from"]);
  await expect(sweptStack(engineer, idOf("tern"), ask(asked))).rejects.toEqual(status(400));
});

test("files hold every place and name the answer with its unit; the drawing stands by itself", async () => {
  const { sweepFile } = await files();
  const map = await sweepFile(engineer, idOf("tern"), ask({ y: "temperature" }));
  const rows = map.csv().split("\r\n");
  expect(rows[0]).toBe('"Silicon thickness, µm","Temperature, °C","Warp, µm",lies');
  expect(rows).toHaveLength(41 * 41 + 2);
  const svg = map.svg();
  expect(svg).toMatch(/^<\?xml/);
  expect(svg).not.toContain("var(--");
  expect(svg).toContain("(Tern)");
  const curve = await sweepFile(engineer, idOf("tern"), ask({ answer: "bow" }));
  expect(curve.csv()).toMatch(/^"Silicon thickness, µm","Bow, device side up, µm",lies\r\n/);
});
