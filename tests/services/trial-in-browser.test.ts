import { expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { Run } from "#app/lib/worker-run.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

const database = useDatabase({ demo: true });

const services = async () => ({
  ...(await import("#app/services/assessments/assessments.server.ts")),
  ...(await import("#app/services/assessments/trial-ground.server.ts")),
  ...(await import("#app/services/assessments/remedies.server.ts")),
  ...(await import("#app/services/assessments/window.server.ts")),
  ...(await import("#app/services/assessments/tried.server.ts")),
  ...(await import("#app/lib/remedies-run.ts")),
  ...(await import("#app/lib/window-run.ts")),
  ...(await import("#app/lib/tried-path.ts")),
});

async function assessed(scope: ActorScope): Promise<string> {
  const { runAssessment } = await services();
  const [flow] = await asOwner<{ id: string }>(database, "select id from flow where name like '%on glass 7.2 ppm'");
  const ran = await runAssessment(scope, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.reason);
  return ran.id;
}

/** As it arrives in the browser. */
const sent = <Value>(value: Value) => JSON.parse(JSON.stringify(value)) as Value;

/** What a run comes to, with what it had found when it was asked now and then on the way. */
function toItsEnd<Found>(run: Run<Found>): { found: Found; partial: Found[] } {
  const partial: Found[] = [];
  for (let asked = 1; ; asked += 1) {
    const next = run.next();
    if (next.done) return { found: next.value, partial };
    if (asked % 25 > 0) continue;
    const soFar = next.value.found?.();
    if (soFar) partial.push(structuredClone(soFar));
  }
}

test("the smallest changes that the browser finds are the server's, to the last digit", async () => {
  const { sentGround, trialQuestion, remediesOf, remediesRun } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const question = trialQuestion(await sentGround(scope, await assessed(scope)));
  const { found, partial } = toItsEnd(remediesRun(sent(question)));
  expect(found).toEqual(await remediesOf(question));
  expect(found.cards.length).toBeGreaterThan(3);
  // Cards come as they are found: none that stood there is gone at the end.
  const posted = new Set(found.cards.map((card) => card.posted));
  expect(partial.length).toBeGreaterThan(1);
  for (const { cards } of partial) for (const card of cards) expect(posted).toContain(card.posted);
}, 60_000);

test("the window that the browser draws is the server's, and rough before it is whole", async () => {
  const { windowAsked, windowOf, windowRun } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const id = await assessed(scope);
  const search = new URLSearchParams({ x: "film thickness 6 0", y: "silicon after 12", step: "12" });
  const { page, question } = await windowAsked(scope, id, search);
  if (!question) throw new Error("the address asks for a window");
  const { found, partial } = toItsEnd(windowRun(sent(question)));
  const answered = await windowOf(scope, id, search);
  expect(sent(found)).toEqual(sent(answered.drawing));
  expect({ ...page, drawing: answered.drawing }).toEqual(answered);
  for (const { x, table } of partial) expect([x.length, table.length]).toEqual([found.x.length, found.table.length]);
}, 60_000);

test("an address with a fault asks for nothing to draw, in the browser as on the server", async () => {
  const { windowAsked, windowOf } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const id = await assessed(scope);
  for (const search of [
    "",
    "x=silicon+after+12&y=silicon+after+12",
    "x=silicon+after+12&y=nothing",
    "x=silicon+after+12&y=film+thickness+6+0&x-to=12+parsecs",
  ]) {
    const { page, question } = await windowAsked(scope, id, new URLSearchParams(search));
    expect(question, search).toBeNull();
    expect(page).toEqual(await windowOf(scope, id, new URLSearchParams(search)));
  }
}, 60_000);

test("inputs go to whoever may assess, and to nobody else", async () => {
  const { sentGround, windowAsked, trialGround } = await services();
  const engineer = await scopeOfPerson(database, "engineer");
  const id = await assessed(engineer);
  const none = new URLSearchParams();
  for (const [role, status] of [
    ["technician", 403],
    ["guest", 404],
  ] as const) {
    const scope = await scopeOfPerson(database, role);
    await expect(sentGround(scope, id)).rejects.toMatchObject({ init: { status } });
    await expect(windowAsked(scope, id, none)).rejects.toMatchObject({ init: { status } });
  }
  expect(await trialGround(await scopeOfPerson(database, "technician"), id)).toMatchObject({ mayAssess: false });
  expect(await sentGround(engineer, id)).toMatchObject({ mayAssess: true });
}, 60_000);

test("every card leads to its figures before and after, with what it says of the flow", async () => {
  const { trialGround, trialQuestion, remediesOf, triedOf, triedPath } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const id = await assessed(scope);
  const found = await remediesOf(trialQuestion(await trialGround(scope, id)));
  expect(found?.cards.length).toBeGreaterThan(0);
  for (const { posted, clears, eases, verdict } of found?.cards ?? []) {
    const place = clears[0] ?? eases[0] ?? null;
    const { searchParams } = new URL(triedPath({ id, leg: null }, posted, place), "http://localhost");
    const page = await triedOf(scope, id, searchParams);
    expect(page.verdict.after).toBe(verdict);
    expect(page.view.shown).toMatchObject({ rule: place?.rule, step: place?.step });
    for (const { rule, step } of clears) {
      const row = page.view.rows.find((each) => each.rule === rule && each.step === step);
      expect(row?.before?.outcome ?? "clear").not.toBe("clear");
      expect(row?.after?.outcome ?? "clear").toBe("clear");
    }
  }
}, 60_000);

test("an address that names no change is refused, and so is one of what is not there", async () => {
  const { triedOf } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const id = await assessed(scope);
  const ask = (changes: string) => triedOf(scope, id, new URLSearchParams({ changes }));
  for (const changes of ["", "{", "[]", JSON.stringify([{ quantity: "silicon after", step: 12, value: -1 }])])
    await expect(ask(changes)).rejects.toMatchObject({ init: { status: 400 } });
  const nowhere = "00000000-0000-4000-8000-000000000000";
  await expect(
    ask(JSON.stringify([{ quantity: "bond", step: 10, carrier: nowhere, material: nowhere, thickness: 4e-5 }])),
  ).rejects.toMatchObject({ init: { status: 404 } });
  const guest = await scopeOfPerson(database, "guest");
  await expect(triedOf(guest, id, new URLSearchParams())).rejects.toMatchObject({ init: { status: 404 } });
}, 60_000);
