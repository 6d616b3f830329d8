import { expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { plannedStep } from "#tests/unit/flows/planned-step.ts";
import { ReferenceSeeder } from "#app/db/seeders/reference-seeder.ts";
import type { ListParams } from "#app/lib/list-params.ts";

const database = useDatabase({ demo: true });

const services = async () => ({
  ...(await import("#app/services/flows/step-library.server.ts")),
  ...(await import("#app/services/flows/flow-templates.server.ts")),
  ...(await import("#app/services/flows/keep-flow.server.ts")),
  ...(await import("#app/services/flows/new-flow-page.server.ts")),
  ...(await import("#app/services/flows/flows.server.ts")),
});

const params = (more: Partial<ListParams> = {}): ListParams => ({
  query: "",
  sort: "name",
  descending: false,
  page: 1,
  filters: {},
  ...more,
});
const { id: _id, ...step } = plannedStep({ title: "Measure twice" });

test("a site starts with four flow templates, three of them of twenty steps or more, and their steps", async () => {
  await database.owner.seeder.seed(ReferenceSeeder);
  const { listFlowTemplates, listStepTemplates } = await services();
  const scope = await scopeOfPerson(database, "technician");
  const templates = await listFlowTemplates(scope, params());
  expect(templates.rows.map(({ name, steps }) => [name, steps])).toEqual([
    ["Glass carrier flow to 50 µm with back-side metal, 300 mm", 21],
    ["Silicon carrier flow to 20 µm with via reveal, 300 mm", 24],
    ["Tape flow to 100 µm, 200 mm", 19],
    ["Two-carrier transfer to 50 µm, lines on both sides, 300 mm", 25],
  ]);
  const bonds = await listStepTemplates(scope, params({ query: "bond", sort: "kind" }));
  expect(bonds.rows.map(({ kind }) => kind)).toEqual([
    ...Array<string>(3).fill("bond"),
    ...Array<string>(4).fill("debond"),
  ]);
  // A second start adds nothing, also when somebody has taken everything out but one.
  await asOwner(database, "delete from flow_template where name like 'Tape%'");
  await database.owner.seeder.seed(ReferenceSeeder);
  expect((await listFlowTemplates(scope, params())).total).toBe(3);
}, 30_000);

test("a flow that starts from a template has all its steps, every number assumed", async () => {
  await database.owner.seeder.seed(ReferenceSeeder);
  const { listFlowTemplates, newFlowPage, addFlow, getFlow } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const [template] = (await listFlowTemplates(scope, params({ query: "glass carrier" }))).rows;
  const page = await newFlowPage(scope, new URLSearchParams({ template: template?.id ?? "" }));
  expect(page.origin?.rows).toHaveLength(21);
  const [petrel] = await asOwner<{ id: string }>(database, "select id from program where slug = 'petrel'");
  const added = await addFlow(scope, {
    name: "From the template",
    note: "",
    program: petrel?.id ?? "",
    silicon: ("silicon" in page.values && page.values.silicon) || "",
    incomingThickness: { value: 775e-6, tolerance: null, source: "supplier" },
    waferKind: "silicon wafer",
    incomingBowAlong: null,
    incomingBowAcross: null,
    incomingFilmShare: null,
    gateBow: null,
    gateWarp: null,
    stack: null,
    flow: null,
    template: template?.id ?? null,
    carrier: null,
    bondingMaterial: null,
  });
  if (added.outcome !== "saved") throw new Error("not added");
  const flow = await getFlow(scope, added.id);
  expect(flow.steps).toHaveLength(21);
  const thicknesses = flow.steps.flatMap(({ films }) => films.flatMap(({ thickness }) => thickness ?? []));
  expect(new Set(thicknesses.map(({ source }) => source))).toEqual(new Set(["assumed"]));
}, 30_000);

test("an engineer keeps, changes and removes a step; a second of that name is refused", async () => {
  const { saveStepTemplate, getStepTemplate, removeStepTemplate } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const saved = await saveStepTemplate(scope, { id: null, version: null, step });
  if (saved.outcome !== "saved") throw new Error("not saved");
  expect(await saveStepTemplate(scope, { id: null, version: null, step })).toEqual({ outcome: "name taken" });
  const kept = await getStepTemplate(scope, saved.id);
  expect(kept.step).toMatchObject({ title: "Measure twice", kind: "measure" });
  const hotter = { ...step, peakTemperature: 400 };
  const version = kept.stamp.version;
  expect(await saveStepTemplate(scope, { id: saved.id, version, step: hotter })).toMatchObject({ outcome: "saved" });
  expect(await saveStepTemplate(scope, { id: saved.id, version, step })).toMatchObject({ outcome: "conflict" });
  expect((await getStepTemplate(scope, saved.id)).step.peakTemperature).toBe(400);
  await removeStepTemplate(scope, saved.id);
  await expect(getStepTemplate(scope, saved.id)).rejects.toMatchObject({ init: { status: 404 } });
});

test("a flow takes the place of a template: its name and note stay, its steps are the flow's", async () => {
  const { keepFlow, keepFlowPage, replaceFlowTemplate, getFlowTemplate, removeFlowTemplate } = await services();
  const engineer = await scopeOfPerson(database, "engineer");
  const flows = await asOwner<{ id: string; name: string; steps: string }>(
    database,
    "select flow.id, flow.name, (select count(*) from flow_step where flow_id = flow.id) as steps from flow order by name",
  );
  const [one, other] = [flows[0], flows.at(-1)];
  if (!one || !other || one.steps === other.steps) throw new Error("the demo has flows of different length");
  const templateId = await keepFlow(engineer, one.id);
  const before = await getFlowTemplate(engineer, templateId);
  expect(before.rows).toHaveLength(Number(one.steps));
  expect(await keepFlowPage(engineer, other.id)).toMatchObject({
    flow: { id: other.id, steps: Number(other.steps) },
    templates: expect.arrayContaining([{ id: templateId, name: before.name }]),
  });
  await replaceFlowTemplate(engineer, other.id, templateId);
  const after = await getFlowTemplate(engineer, templateId);
  expect(after).toMatchObject({ name: before.name, note: before.note });
  expect(after.rows).toHaveLength(Number(other.steps));
  const technician = await scopeOfPerson(database, "technician");
  await expect(keepFlowPage(technician, one.id)).rejects.toMatchObject({ init: { status: 403 } });
  await expect(replaceFlowTemplate(technician, one.id, templateId)).rejects.toMatchObject({ init: { status: 403 } });
  const guest = await scopeOfPerson(database, "guest");
  await expect(keepFlowPage(guest, one.id)).rejects.toMatchObject({ init: { status: 404 } });
  await removeFlowTemplate(engineer, templateId);
});

test("a technician reads the library and changes nothing; a guest does not see it", async () => {
  const { saveStepTemplate, listStepTemplates, keepFlow } = await services();
  const technician = await scopeOfPerson(database, "technician");
  const [flow] = await asOwner<{ id: string }>(database, "select id from flow limit 1");
  const save = saveStepTemplate(technician, { id: null, version: null, step });
  await expect(save).rejects.toMatchObject({ init: { status: 403 } });
  await expect(keepFlow(technician, flow?.id ?? "")).rejects.toMatchObject({ init: { status: 403 } });
  const guest = await scopeOfPerson(database, "guest");
  await expect(listStepTemplates(guest, params())).rejects.toMatchObject({ init: { status: 403 } });
});
