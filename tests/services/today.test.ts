import { beforeAll, expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const today = () => import("#app/services/today.server.ts");
const flows = () => import("#app/services/flows/new-flow.server.ts");
const assessments = () => import("#app/services/assessments/assessments.server.ts");

// Loading the server's modules takes longer than a test should.
beforeAll(() => Promise.all([today(), flows(), assessments()]), 60_000);

const TERN = "Tern T-2, to 100 µm on tape";

test("a flow goes from not assessed over clear to out of date, and to a decision once it fails", async () => {
  const engineer = await scopeOfPerson(database, "engineer");
  const { todayView } = await today();
  const { runAssessment } = await assessments();
  const delivered = await todayView(engineer);
  expect([delivered.decisions.total, delivered.outOfDate.total, delivered.notAssessed.total]).toEqual([0, 0, 5]);
  expect(delivered.scans[0]).toMatchObject({ label: "M-0388", film: "Polymer dielectric A" });

  const { copyFlow } = await flows();
  const [demo] = await asOwner<{ id: string }>(database, "select id from flow where name = ?", [TERN]);
  await copyFlow(engineer, demo?.id ?? "");
  const before = await todayView(engineer);
  const tern = before.notAssessed.rows.find(({ name }) => name.startsWith(TERN));
  expect(before.notAssessed.total).toBe(6);
  expect(tern).toMatchObject({ program: "Tern", mayAssess: true });
  expect(before.programs).toMatchObject([
    { name: "Fulmar", flows: 2, stacks: 1 },
    { name: "Petrel", flows: 3, stacks: 1 },
    { name: "Tern", diameter: 0.2, flows: 2, stacks: 1 },
  ]);

  const flow = tern?.id ?? "";
  expect(await runAssessment(engineer, flow)).toMatchObject({ outcome: "stored" });
  const clear = await todayView(engineer);
  expect([clear.decisions.total, clear.outOfDate.total, clear.notAssessed.total]).toEqual([0, 0, 5]);

  await asOwner(database, "update flow_step set planned = 'bare' where flow_id = ? and kind = 'grind'", [flow]);
  await asOwner(database, "update flow set updated_at = now() where id = ?", [flow]);
  const stale = await todayView(engineer);
  expect(stale.outOfDate).toMatchObject({ total: 1, rows: [{ id: flow, newest: { number: 1, outcome: "clear" } }] });

  await runAssessment(engineer, flow);
  const failing = await todayView(engineer);
  expect(failing.outOfDate.total).toBe(0);
  const [row] = failing.decisions.rows;
  expect(row).toMatchObject({ id: flow, diameter: 0.2, newest: { number: 2, outcome: "do not run" } });
  expect(row?.sentence).toMatch(/^Step 14, Grind to 110 µm: /);
  expect(row?.wafer).toMatchObject({ holding: "bare", faceUp: expect.any(String) as string });
  // Two assessments of nineteen steps.
}, 30_000);

test("a technician sees the same, without the right to assess", async () => {
  const { todayView } = await today();
  const view = await todayView(await scopeOfPerson(database, "technician"));
  expect(view).toMatchObject({ works: true, mayAssess: false, mayUpload: true });
  const flows = [...view.decisions.rows, ...view.outOfDate.rows, ...view.notAssessed.rows];
  expect(flows.every(({ mayAssess }) => !mayAssess)).toBe(true);
});

test("a guest gets their own program and nothing of the work in it", async () => {
  const { todayView } = await today();
  const view = await todayView(await scopeOfPerson(database, "guest"));
  expect(view).toMatchObject({ works: false, mayAssess: false, mayUpload: false, scans: [] });
  expect(view.programs).toMatchObject([{ name: "Tern", flows: 0, stacks: 0 }]);
  expect([view.decisions.total, view.outOfDate.total, view.notAssessed.total]).toEqual([0, 0, 0]);
});
