import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, test } from "vitest";
import type { FloorEntryForm } from "#app/schemas/floor-entry.ts";
import { giveForm, type GiveForm } from "#app/schemas/hand-over.ts";
import { refusedSentence } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { newLot, releaseFirstFlow } from "./lot-on-sheet.ts";

const database = useDatabase({ demo: true });

const handing = () => import("#app/services/floor/hand-over.server.ts");
const listing = () => import("#app/services/floor/lots-at-place.server.ts");
const assigning = () => import("#app/services/floor/assign-sheet.server.ts");
const entering = () => import("#app/services/floor/entries.server.ts");
const blocking = () => import("#app/services/floor/hold-and-stop.server.ts");

const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;
const refusal = async (work: Promise<unknown>) =>
  refusedSentence(
    await work.then(
      () => null,
      (error: unknown) => error,
    ),
  );

let technician: ActorScope;
let lead: ActorScope;
let guest: ActorScope;
let revision = "";
let lot = "";
let held = "";

beforeAll(async () => {
  const engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  lead = await scopeOfPerson(database, "shift-lead");
  guest = await scopeOfPerson(database, "guest");
  revision = await releaseFirstFlow(database, "tern");
  lot = await newLot(database, "T-0430", "tern");
  held = await newLot(database, "P-0012", "petrel");
  await (await assigning()).assignSheet(engineer, lot, { revision, fromStep: 1, reason: "" });
  const { holdLot } = await blocking();
  await holdLot(lead, held, { id: randomUUID(), cause: "tool trouble", reason: "Chuck leaks" });
  await say({ kind: "acknowledged" }, null);
  await say({ kind: "started" }, 1);
}, 120_000);

type Content = Pick<FloorEntryForm, "kind"> & Record<string, unknown>;

async function say(content: Content, step: number | null): Promise<void> {
  const form = { id: randomUUID(), revision, leg: 0, step, at: null, ...content } as FloorEntryForm;
  const entered = await (await entering()).enter(technician, lot, form);
  if (entered.outcome !== "stored") throw new Error(entered.sentence);
}

const given = (lots: string[], place = "Grinding bay"): GiveForm => ({
  given: randomUUID(),
  place,
  remark: "The coolant was changed",
  lots: lots.map((id) => ({ lot: id, on: "frame 7", remark: "" })),
});

const rows = async (who: ActorScope, place = "") => (await handing()).handOvers(who, place);

describe("a place that is handed over", () => {
  test("offers the lots that are on the floor, and those that are held", async () => {
    const { lots } = await (await listing()).lotsToHandOver(technician);
    expect(lots.map(({ name }) => name)).toEqual(["T-0430", "P-0012"]);
    expect(lots[0]?.sheet).toMatch(/^TERN-H\d+ A$/);
    expect(lots[1]?.sheet).toBeNull();
    await expect((await listing()).lotsToHandOver(guest)).rejects.toEqual(status(403));
  });

  test("needs a place, a lot, and what each lot is on", () => {
    const sent = { given: randomUUID(), place: " ", lots: [{ on: "" }] };
    expect(giveForm.safeParse(sent).error?.issues.map(({ path }) => path.join("."))).toEqual(["place", "lots"]);
    const ticked = { ...sent, place: "Bay", lots: [{ on: "" }, { lot: randomUUID(), on: " " }] };
    expect(giveForm.safeParse(ticked).error?.issues.map(({ path }) => path.join("."))).toEqual(["lots.1.on"]);
  });

  test("is written as it stands, one record for each program, and counts once however often it is sent", async () => {
    await say({ kind: "observed", text: "A scratch on W03", count: 1 }, 1);
    const form = given([lot, held]);
    const { giveOver, handOver } = await handing();
    await Promise.all([giveOver(technician, form), giveOver(technician, form)]);
    await giveOver(technician, form);
    const all = await rows(lead);
    expect(all.map(({ program, place, lots, taken }) => [program, place, lots, taken]).toSorted()).toEqual([
      ["Petrel", "Grinding bay", 1, null],
      ["Tern", "Grinding bay", 1, null],
    ]);
    const view = await handOver(lead, all.find(({ program }) => program === "Tern")?.id);
    expect(view).toMatchObject({
      mayTake: true,
      moved: [],
      remark: "The coolant was changed",
      by: technician.actor.name,
    });
    const [there] = view.content;
    expect(there).toMatchObject({ name: "T-0430", on: "frame 7", blocks: [] });
    expect(there?.at.join()).toMatch(/^step 1, .* is under way$/);
    expect(there?.odd.join()).toContain("A scratch on W03");
    const other = await handOver(lead, all.find(({ program }) => program === "Petrel")?.id);
    expect(other.content[0]?.blocks).toEqual(["Lot P-0012 is held: tool trouble."]);
    expect((await (await listing()).lotsToHandOver(lead)).lots[0]).toMatchObject({
      on: "frame 7",
      place: "Grinding bay",
    });
  });

  test("is found by its place, and by nobody outside of its program", async () => {
    expect(await rows(lead, "grind")).toHaveLength(2);
    expect(await rows(lead, "cabinet")).toEqual([]);
    await expect(rows(guest)).rejects.toEqual(status(403));
    const [first] = await rows(lead);
    await expect((await handing()).handOver(guest, first?.id)).rejects.toEqual(status(404));
    await expect((await handing()).takeOver(guest, first?.id, "")).rejects.toEqual(status(404));
  });

  test("says which lots went on since", async () => {
    await say({ kind: "done", count: null }, 1);
    const tern = (await rows(lead)).find(({ program }) => program === "Tern");
    expect((await (await handing()).handOver(lead, tern?.id)).moved).toEqual(["T-0430"]);
  });

  test("is taken over once, by somebody else", async () => {
    const { takeOver, handOver, handOversToTake } = await handing();
    const tern = (await rows(lead)).find(({ program }) => program === "Tern");
    expect(await handOversToTake(technician)).toBe(0);
    expect(await handOversToTake(lead)).toBe(2);
    const { todayView } = await import("#app/services/today.server.ts");
    expect((await todayView(technician)).lots.toTake.total).toBe(0);
    const waits = (await todayView(lead)).lots.toTake;
    expect(waits.total).toBe(2);
    expect(waits.rows[0]?.words).toMatch(/^\d lots?, given by /);
    expect(await refusal(takeOver(technician, tern?.id, ""))).toContain("Somebody of the next shift takes it");
    // The lots of the other program at that place have a record of their own, to which the taking leads on.
    const petrel = (await rows(lead)).find(({ program }) => program === "Petrel");
    expect(await takeOver(lead, tern?.id, "All there")).toBe(petrel?.id);
    expect(await takeOver(lead, tern?.id, "Pressed twice")).toBe(petrel?.id);
    const view = await handOver(technician, tern?.id);
    expect(view).toMatchObject({ taken: { by: lead.actor.name }, takenRemark: "All there", mayTake: false, moved: [] });
    const engineer = await scopeOfPerson(database, "engineer");
    expect(await refusal(takeOver(engineer, tern?.id, ""))).toContain(`${lead.actor.name} has taken this over already`);
    expect(await handOversToTake(lead)).toBe(1);
  });

  test("is not taken any more once the place was handed over again", async () => {
    const { giveOver, takeOver, handOver } = await handing();
    const petrel = (await rows(lead)).find(({ program }) => program === "Petrel");
    await giveOver(technician, given([held]));
    expect(await handOver(lead, petrel?.id)).toMatchObject({ replaced: true, mayTake: false });
    expect(await refusal(takeOver(lead, petrel?.id, ""))).toContain("handed over again since");
  });

  test("never changes, not even for who forgets every rule", async () => {
    const change = (sql: string) => asOwner(database, sql).then(() => "changed", String);
    expect(await change("update hand_over set place = 'elsewhere'")).toContain("else never changes");
    expect(await change("delete from hand_over")).toContain("never deleted");
    const { inScope } = await import("#app/server/scope.server.ts");
    const taken = await inScope(technician, (em) =>
      em.execute<{ id: string }[]>(
        "update hand_over set taken_at = now(), taken_by_id = ?, taken_remark = '' where taken_at is null returning id",
        [technician.actor.id],
      ),
    );
    expect(taken).toEqual([]);
  });
});
