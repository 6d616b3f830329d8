import { beforeAll, expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { StepPlan } from "#app/schemas/flow-plan.ts";
import type { WhatIfChange, WhatIfSnapshot } from "#app/schemas/what-if.ts";

const database = useDatabase({ demo: true });

const services = async () => ({
  ...(await import("#app/services/flows/what-if.server.ts")),
  ...(await import("#app/services/flows/new-flow.server.ts")),
  ...(await import("#app/services/flows/steps.server.ts")),
  ...(await import("#app/services/flows/step-page.server.ts")),
  ...(await import("#app/services/flows/step-library.server.ts")),
  ...(await import("#app/services/library/carrier-units.server.ts")),
  ...(await import("#app/services/library/carrier-unit-form.server.ts")),
  ...(await import("#app/components/flows/step-form-values.ts")),
  ...(await import("#app/schemas/flow.ts")),
  ...(await import("#app/lib/what-if.ts")),
});

let scope: ActorScope;
let owner: ActorScope;

beforeAll(async () => {
  await services();
  scope = await scopeOfPerson(database, "engineer");
  owner = await scopeOfPerson(database, "process-owner");
}, 60_000);

/** A copy of the Petrel flow on glass 3.0 ppm, which is the test's own. */
async function ownFlow(): Promise<string> {
  const { copyFlow } = await services();
  const [petrel] = await asOwner<{ id: string }>(database, "select id from flow where name like '%glass 3.0 ppm'");
  const copied = await copyFlow(scope, petrel?.id ?? "");
  if (copied.outcome !== "saved") throw new Error("not copied");
  return copied.id;
}

async function pieceOf(carrier: string, mark: string): Promise<string> {
  const { addCarrierUnit } = await services();
  const [kind] = await asOwner<{ id: string }>(database, "select id from carrier where name = ?", [carrier]);
  const added = await addCarrierUnit(owner, kind?.id ?? "", { mark, uses: 4 });
  if (added.outcome !== "saved" || added.id === null) throw new Error("no piece added");
  return added.id;
}

/** Posts the form of a piece's thickness variation; the status of what is not saved, null when it is. */
async function measure(carrier: string, mark: string, variation: string): Promise<number | null> {
  const { saveCarrierUnitForm } = await services();
  const [unit] = await asOwner<{ id: string; carrier: string; version: number }>(
    database,
    `select unit.id, unit.version, carrier.id as carrier from carrier_unit unit
       join carrier on carrier.id = unit.carrier_id where carrier.name = ? and mark = ?`,
    [carrier, mark],
  );
  if (!unit) throw new Error("no such piece");
  const body = new URLSearchParams({ change: "measure", piece: unit.id, version: String(unit.version), variation });
  const request = new Request("http://127.0.0.1/", { method: "POST", body });
  try {
    const { init } = await saveCarrierUnitForm(request, owner, { carrierId: unit.carrier, back: "/" });
    return init?.status ?? null;
  } catch (answer) {
    if (answer instanceof Response) return null;
    throw answer;
  }
}

/** Saves a step of a kind as its form would, with other handling. */
async function save(flowId: string, kind: string, handling: Record<string, string>) {
  const { saveStep, stepPage, stepFormValues, stepSchema } = await services();
  const [row] = await asOwner<{ id: string }>(
    database,
    "select id from flow_step where flow_id = ? and kind = ? order by position",
    [flowId, kind],
  );
  const { step, flow } = await stepPage(scope, { flowId, stepId: row?.id });
  const values = stepFormValues(step);
  const posted = { ...values, handling: { ...values.handling, ...handling } };
  // A blank field is not sent.
  const typed = stepSchema.parse(
    JSON.parse(JSON.stringify(posted, (_key, value: unknown) => (value === "" ? undefined : value))),
  );
  return {
    stepId: row?.id ?? "",
    saved: await saveStep(scope, { flowId, stepId: step.id, position: 0, version: flow.version }, typed),
  };
}

test("a profile and a piece that are saved reach the engine, and a what-if treats them as the server does", async () => {
  const { whatIfSnapshot, applyWhatIf, changedInput } = await services();
  const flowId = await ownFlow();
  const piece = await pieceOf("Glass carrier 3.0 ppm", "RUN-1");
  await measure("Glass carrier 3.0 ppm", "RUN-1", "0.4 um");
  const { saved, stepId } = await save(flowId, "anneal", { profile: "0 25; 30 200; 60 200; 90 25", machine: "oven 3" });
  expect(saved).toMatchObject({ outcome: "saved" });
  const bond = await save(flowId, "bond", { carrierPiece: piece });
  expect(bond.saved).toMatchObject({ outcome: "saved" });

  const snapshot = JSON.parse(JSON.stringify(await whatIfSnapshot(scope, flowId))) as WhatIfSnapshot;
  const anneal = snapshot.input.steps[snapshot.stepIds.indexOf(stepId)];
  expect(anneal).toMatchObject({ machine: "oven 3", peakTemperature: 473.15, profile: { length: 4 } });
  expect(snapshot.input.steps.find(({ kind }) => kind === "bond")?.bond?.carrier).toMatchObject({
    identity: "RUN-1",
    uses: 4,
    thicknessVariation: { value: expect.closeTo(0.4e-6, 12) as number, source: "measured here" },
  });

  const other = snapshot.carriers.find(({ name }) => name === "Silicon carrier 775 µm")?.id ?? "";
  const changes: WhatIfChange[] = [
    { step: stepId, film: null, field: "peakTemperature", value: 453.15 },
    { step: bond.stepId, film: null, field: "carrier", value: other },
  ];
  const inBrowser = changedInput(snapshot, changes);
  await applyWhatIf(scope, { flowId, version: snapshot.version }, JSON.stringify(changes));
  const after = await whatIfSnapshot(scope, flowId);
  expect(after.input).toEqual({ ...inBrowser, name: after.input.name });
  expect(after.input.steps.find(({ kind }) => kind === "bond")?.bond?.carrier.identity).toBeUndefined();
}, 30_000);

test("a piece of another carrier is refused at its field, and none goes into the library", async () => {
  const { keepStep } = await services();
  const flowId = await ownFlow();
  const wrong = await pieceOf("Glass carrier 7.2 ppm", "RUN-2");
  expect((await save(flowId, "bond", { carrierPiece: wrong })).saved).toEqual({ outcome: "other piece" });
  const right = await pieceOf("Glass carrier 3.0 ppm", "RUN-3");
  const { stepId } = await save(flowId, "bond", { carrierPiece: right });
  const kept = await keepStep(owner, flowId, stepId);
  const [row] = await asOwner<{ step: StepPlan }>(database, "select step from step_template where id = ?", [kept]);
  expect(row?.step.handling.carrierPiece).toBeNull();
});

test("a step that was stored before any of it was asked has none of it", async () => {
  const { whatIfSnapshot, stepPage, stepFormValues } = await services();
  const flowId = await ownFlow();
  await asOwner(
    database,
    "update flow_step set handling = handling - 'profile' - 'sideUp' - 'machine' - 'recipe' - 'carrierPiece' where flow_id = ?",
    [flowId],
  );
  const { input, stepIds } = await whatIfSnapshot(scope, flowId);
  expect(input.steps.every((step) => !("profile" in step) && !("sideUp" in step))).toBe(true);
  const { step } = await stepPage(scope, { flowId, stepId: stepIds[0] });
  expect(stepFormValues(step).handling).toMatchObject({ profile: "", sideUp: "", machine: "", carrierPiece: "" });
});

test("a thickness variation that cannot be read is refused, and a blank one takes it away", async () => {
  const id = await pieceOf("Glass carrier 3.0 ppm", "RUN-4");
  const kept = async () => {
    const [row] = await asOwner<{ measured: { value: number } | null }>(
      database,
      "select thickness_variation as measured from carrier_unit where id = ?",
      [id],
    );
    return row?.measured?.value ?? null;
  };
  for (const typed of ["12 parsecs", "-1 um", "3"])
    expect(await measure("Glass carrier 3.0 ppm", "RUN-4", typed)).toBe(400);
  expect(await kept()).toBeNull();
  expect(await measure("Glass carrier 3.0 ppm", "RUN-4", "0,6 µm")).toBeNull();
  expect(await kept()).toBeCloseTo(0.6e-6, 12);
  expect(await measure("Glass carrier 3.0 ppm", "RUN-4", " ")).toBeNull();
  expect(await kept()).toBeNull();
});
