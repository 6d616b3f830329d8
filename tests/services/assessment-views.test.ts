import { beforeAll, describe, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const flows = () => import("#app/services/flows/new-flow.server.ts");
const assessments = () => import("#app/services/assessments/assessments.server.ts");
const changed = () => import("#app/services/assessments/what-changed.server.ts");
const newest = () => import("#app/services/assessments/newest-assessments.server.ts");
const comparison = () => import("#app/services/assessments/comparison.server.ts");
const request = () => import("#app/services/assessments/change-request.server.ts");

// Loading the server's modules takes longer than a test should.
beforeAll(() => Promise.all([flows(), assessments(), changed(), newest(), comparison(), request()]), 60_000);

const LIST = { query: "", sort: "run", descending: false, page: 1, filters: {} };
const STRESS = `update film set stress = jsonb_set(stress::jsonb, '{value}', to_jsonb(?::float8)), updated_at = now(),
                updated_by_id = (select id from person where email = 'engineer@kestrel-ridge.example')
                where name = 'Polymer dielectric A'`;

let engineer: ActorScope;
let flow = "";
let first = "";

beforeAll(async () => {
  engineer = await scopeOfPerson(database, "engineer");
  const [tern] = await asOwner<{ id: string }>(database, "select id from flow where name like 'Tern %'");
  const { copyFlow } = await flows();
  // A copy, which nobody has assessed yet.
  const copied = await copyFlow(engineer, tern?.id ?? "");
  flow = copied.outcome === "saved" ? copied.id : "";
  const { runAssessment } = await assessments();
  const ran = await runAssessment(engineer, flow);
  first = ran.outcome === "stored" ? ran.id : "";
}, 60_000);

/** Whether the list and the page call the assessment out of date; they must agree. */
async function outOfDate(): Promise<boolean> {
  const { listNewestAssessments } = await newest();
  const { getAssessment } = await assessments();
  const { rows } = await listNewestAssessments(engineer, LIST);
  const listed = rows.find(({ id }) => id === first)?.outOfDate;
  const { outOfDate: shown } = await getAssessment(engineer, first);
  expect(listed).toBe(shown);
  return shown;
}

test("a film's stress puts an assessment out of date, says who, and putting it back puts it right", async () => {
  const { whatChanged } = await changed();
  expect(await outOfDate()).toBe(false);
  expect(await whatChanged(engineer, first)).toBeNull();

  await asOwner(database, STRESS, [35e6]);
  expect(await outOfDate()).toBe(true);
  expect(await whatChanged(engineer, first)).toMatchObject({
    engine: null,
    changes: [
      {
        subject: "Polymer dielectric A",
        steps: [3, 8],
        by: "Ines Varga",
        to: "+35.0\u00A0±\u00A03.0\u00A0MPa".replace(/\u00A0±\u00A0/, " ± "),
      },
    ],
    movement: { outcome: "computed", before: { outcome: "clear" }, after: { outcome: "clear" }, moved: [] },
  });

  await asOwner(database, STRESS, [30e6]);
  expect(await outOfDate()).toBe(false);
}, 30_000);

test("a limit does so too, and so does a flow that cannot be computed any more", async () => {
  const { whatChanged } = await changed();
  const margin = (value: number) =>
    asOwner(database, "update site_limit set value = ?, updated_at = now() where key = 'warpMargin'", [value]);
  await margin(0.9);
  expect(await outOfDate()).toBe(true);
  expect(await whatChanged(engineer, first)).toMatchObject({
    changes: [{ subject: "Site limit", to: "90\u00A0%" }],
    movement: { after: { outcome: "caution" } },
  });
  await margin(0.2);

  const silicon =
    "update flow_step set silicon_after = jsonb_set(silicon_after::jsonb, '{value}', '-0.0001') where flow_id = ? and kind = 'grind'";
  const [before] = await asOwner<{ silicon_after: unknown }>(
    database,
    "select silicon_after from flow_step where flow_id = ? and kind = 'grind'",
    [flow],
  );
  await asOwner(database, silicon, [flow]);
  expect((await whatChanged(engineer, first))?.movement).toMatchObject({ outcome: "not computable", step: 14 });
  await asOwner(database, "update flow_step set silicon_after = ? where flow_id = ? and kind = 'grind'", [
    JSON.stringify(before?.silicon_after),
    flow,
  ]);
  expect(await outOfDate()).toBe(false);
}, 30_000);

describe("the program is a wall", () => {
  test("a guest learns of no assessment, of no comparison and of no change", async () => {
    const guest = await scopeOfPerson(database, "guest");
    const { whatChanged } = await changed();
    const { comparisonOffer } = await comparison();
    const { changeSubjects, changeReach } = await request();
    const status = (code: number) =>
      expect.objectContaining({ init: expect.objectContaining({ status: code }) as unknown });
    await expect(whatChanged(guest, first)).rejects.toEqual(status(404));
    await expect(comparisonOffer(guest, first, { withId: null, query: "" })).rejects.toEqual(status(404));
    await expect(changeSubjects(guest)).rejects.toEqual(status(403));
    const change = {
      subject: { kind: "limit", id: "warpMargin", name: "" },
      property: "value",
      value: 0.3,
      title: "",
    } as const;
    await expect(changeReach(guest, change, undefined)).rejects.toEqual(status(403));
  });

  test("a change is computed for the flows of the person's own programs only, and stores nothing", async () => {
    const { changeReach } = await request();
    const change = {
      subject: { kind: "limit", id: "warpMargin", name: "" },
      property: "value",
      value: 0.9,
      title: "",
    } as const;
    const reach = await changeReach(engineer, change, undefined);
    expect(reach).toMatchObject({ flows: 7, more: 0 });
    expect(reach.touched).toContainEqual(
      expect.objectContaining({ id: flow, newest: expect.objectContaining({ id: first }) as unknown }),
    );
    const outsider = {
      ...engineer,
      actor: {
        ...engineer.actor,
        memberships: engineer.actor.memberships.filter(({ programSlug }) => programSlug !== "tern"),
      },
    };
    const elsewhere = await changeReach(outsider, change, undefined);
    expect(elsewhere.flows).toBe(5);
    expect(elsewhere.touched.map(({ program }) => program.slug)).not.toContain("tern");
    const [{ count } = { count: 0 }] = await asOwner<{ count: number }>(
      database,
      "select count(*)::int as count from assessment",
    );
    // The one delivered and this test's own.
    expect(count).toBe(2);
  }, 30_000);
});

test("a comparison offers the revision before, and the first of a flow has nothing to stand beside", async () => {
  const { comparisonOffer } = await comparison();
  const { runAssessment } = await assessments();
  const alone = await comparisonOffer(engineer, first, { withId: null, query: "" });
  expect(alone).toMatchObject({ sameFlow: [], chosen: null });
  const ran = await runAssessment(engineer, flow);
  const second = ran.outcome === "stored" ? ran.id : "";
  const offer = await comparisonOffer(engineer, second, { withId: null, query: "" });
  expect(offer.chosen).toMatchObject({
    before: { id: first, number: 1 },
    after: { id: second, number: 2 },
    changes: [],
  });
  // The older one stands first, whichever was asked for.
  expect((await comparisonOffer(engineer, first, { withId: second, query: "" })).chosen?.before.id).toBe(first);
}, 30_000);
