import { beforeAll, expect, test } from "vitest";
import type { LotInput } from "#app/schemas/lot.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const assessments = () => import("#app/services/assessments/assessments.server.ts");
const lots = () => import("#app/services/assessments/lot.server.ts");
const newest = () => import("#app/services/assessments/newest-assessments.server.ts");
const comparison = () => import("#app/services/assessments/comparison.server.ts");
const request = () => import("#app/services/assessments/change-request.server.ts");
const list = () => import("#app/services/flows/flows.server.ts");
const page = () => import("#app/services/flows/flow-page.server.ts");
const today = () => import("#app/services/today.server.ts");

const um = (micrometres: number) => micrometres / 1e6;
const LOT: LotInput = {
  name: "K-17",
  bow: um(-180),
  thickness: um(720),
  warp: null,
  edgeChips: "none",
  identity: "matches",
  wafers: [
    { slot: 1, bow: um(-60), thickness: um(725) },
    { slot: 2, bow: um(-300), thickness: um(715) },
  ],
};
const LIST = { query: "", sort: "run", descending: false, page: 1, filters: {} };

const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;

let engineer: ActorScope;
let technician: ActorScope;
let guest: ActorScope;
let flow = "";
let of = "";
let kept = "";

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([assessments(), lots(), newest(), comparison(), request(), list(), page(), today()]);
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  const [row] = await asOwner<{ id: string; flow_id: string }>(
    database,
    "select a.id, a.flow_id from assessment a join flow f on f.id = a.flow_id where f.name like 'Tern %'",
  );
  flow = row?.flow_id ?? "";
  of = row?.id ?? "";
  const { keepLot } = await lots();
  const stored = await keepLot(engineer, of, LOT);
  kept = stored.outcome === "stored" ? stored.id : "";
}, 90_000);

test("a kept lot has its own inputs and result, and says which assessment it is of", async () => {
  const { getAssessment } = await assessments();
  const own = await getAssessment(engineer, kept);
  expect(own).toMatchObject({ number: 1, documentNumber: 2, outOfDate: false, lot: { name: "K-17", of: { id: of } } });
  expect(own.lot?.answers.map(({ slot }) => slot)).toEqual([1, 2]);
  expect(own.result.steps[0]?.atRoom?.bow).toBeCloseTo(um(-180), 8);
});

test("no list takes it for the newest assessment of its flow, and its number is not used up", async () => {
  const { listNewestAssessments } = await newest();
  expect((await listNewestAssessments(engineer, LIST)).rows.map(({ id }) => id)).toEqual([of]);
  const { listFlows } = await list();
  const listed = await listFlows(engineer, { ...LIST, sort: "name" });
  expect(listed.rows.find(({ id }) => id === flow)?.latest?.id).toBe(of);
  const { todayView } = await today();
  expect(JSON.stringify(await todayView(engineer))).not.toContain(kept);
  const { comparisonOffer } = await comparison();
  expect((await comparisonOffer(engineer, of, { withId: null, query: "" })).sameFlow).toEqual([]);
  const { changeReach } = await request();
  const change = {
    subject: { kind: "limit", id: "warpMargin", name: "" },
    property: "value",
    value: 0.9,
    title: "",
  } as const;
  const { touched } = await changeReach(engineer, change, "tern");
  expect(touched.map(({ newest: last }) => last?.id)).toEqual([of]);
  const { flowPage } = await page();
  const shown = await flowPage(engineer, flow);
  expect(shown.assessments.map(({ id }) => id)).toEqual([of]);
  expect(shown.lots).toMatchObject([{ id: kept, name: "K-17", wafers: 2, number: 1 }]);
  const { runAssessment, getAssessment } = await assessments();
  const ran = await runAssessment(engineer, flow);
  expect(await getAssessment(engineer, ran.outcome === "stored" ? ran.id : "")).toMatchObject({
    number: 2,
    documentNumber: 3,
  });
}, 30_000);

test("it is neither run again, nor compared, nor the ground for another lot", async () => {
  const { runAgain } = await assessments();
  const { comparisonOffer } = await comparison();
  const { lotPage } = await lots();
  await expect(runAgain(engineer, kept)).rejects.toEqual(status(409));
  await expect(comparisonOffer(engineer, kept, { withId: null, query: "" })).rejects.toEqual(status(409));
  await expect(comparisonOffer(engineer, of, { withId: kept, query: "" })).rejects.toEqual(status(409));
  await expect(lotPage(engineer, kept)).rejects.toEqual(status(409));
});

test("a technician tries a lot and cannot keep it; a guest does not learn that there is an assessment", async () => {
  const { keepLot, tryLot, lotPage } = await lots();
  expect(await lotPage(technician, of)).toMatchObject({ mayKeep: false });
  expect(await tryLot(technician, of, LOT)).toMatchObject({ outcome: "computed" });
  await expect(keepLot(technician, of, LOT)).rejects.toEqual(status(403));
  await expect(tryLot(guest, of, LOT)).rejects.toEqual(status(404));
  await expect(keepLot(guest, of, LOT)).rejects.toEqual(status(404));
});
