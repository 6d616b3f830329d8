import { expect, test } from "vitest";
import type { FlowChange } from "#app/engine/trial/change.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const services = async () => ({
  ...(await import("#app/services/assessments/assessments.server.ts")),
  ...(await import("#app/services/assessments/finder.server.ts")),
  ...(await import("#app/services/assessments/trial-ground.server.ts")),
  ...(await import("#app/services/assessments/remedies.server.ts")),
  ...(await import("#app/services/assessments/try-on-copy.server.ts")),
  ...(await import("#app/engine/trial/change.ts")),
});

const PETREL = "Petrel P-3, on glass 3.3 ppm";

async function assessed(scope: ActorScope, name: string): Promise<string> {
  const { runAssessment } = await services();
  const [flow] = await asOwner<{ id: string }>(database, "select id from flow where name = ?", [name]);
  const ran = await runAssessment(scope, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.reason);
  return ran.id;
}

/** The assessment of the copy, from the address of the comparison. */
const copyIn = (path: string) => /\/assessments\/([0-9a-f-]+)\/compare/.exec(path)?.[1];

test("the copy's plan comes to the very flow that the engine tried, for every kind of change", async () => {
  const { trialGround, tryOnCopy, applyChange } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const id = await assessed(scope, PETREL);
  const { input, catalogue } = await trialGround(scope, id);
  const idOf = (list: readonly { id: string; name: string }[], name: string) =>
    list.find((each) => each.name === name)?.id ?? "";
  const materials = catalogue.materials.map(({ material }) => material);
  const number = (kind: string) => input.flow.steps.findIndex((step) => step.kind === kind) + 1;
  const bond = number("bond");
  const mounter = catalogue.tools.find(({ kinds }) => kinds.includes("mount on frame"))?.tool.id ?? "";
  const changes: FlowChange[] = [
    { quantity: "silicon after", step: number("stress relief"), value: 54e-6 },
    { quantity: "peak temperature", step: number("anneal"), value: 453.15 },
    { quantity: "bond thickness", step: bond, value: 30e-6 },
    { quantity: "trim depth", step: number("edge trim"), value: 120e-6 },
    { quantity: "film thickness", step: number("plate"), film: 0, value: 3e-6 },
    { quantity: "film stress", step: number("cure"), film: 0, value: 20e6 },
    { quantity: "film on the back", step: number("deposit"), film: 0, value: 0.2e-6 },
    { quantity: "support", step: number("edge trim"), holding: "thin-wafer gripper" },
    { quantity: "tool", step: number("grind"), tool: mounter },
    { quantity: "frame", step: 9, tool: mounter },
    { quantity: "place", step: 16, to: 13 },
    {
      quantity: "bond",
      step: bond,
      carrier: idOf(catalogue.carriers, "Glass carrier 3.0 ppm"),
      material: idOf(materials, "Laser-release adhesive B"),
      thickness: input.flow.steps[bond - 1]?.bond?.thickness.value ?? 0,
    },
    {
      quantity: "bond",
      step: bond,
      carrier: idOf(catalogue.carriers, "Silicon carrier 775 µm"),
      material: idOf(materials, "Peel adhesive C with release layer"),
      thickness: 40e-6,
    },
  ];
  for (const change of changes) {
    const { path } = await tryOnCopy(scope, id, JSON.stringify([change]));
    const copy = await trialGround(scope, copyIn(path));
    const expected = applyChange(input.flow, change, catalogue);
    expect(expected).not.toEqual(input.flow);
    const untitled = ({ steps, ...flow }: typeof expected) => ({
      ...flow,
      name: "",
      steps: steps.map((step) => ({ ...step, title: "" })),
    });
    expect(JSON.parse(JSON.stringify(untitled(copy.input.flow)))).toEqual(
      JSON.parse(JSON.stringify(untitled(expected))),
    );
  }
}, 60_000);

test("where slots part, a change made in the plan comes to what the engine tried on the leg", async () => {
  const { trialGround, tryOnCopy, applyChange, runAssessment } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const [flow] = await asOwner<{ id: string }>(database, "select id from flow where name = ?", [PETREL]);
  const { copyFlow } = await import("#app/services/flows/new-flow.server.ts");
  const [low, high] = [
    Array.from({ length: 12 }, (_, index) => index + 1),
    Array.from({ length: 13 }, (_, index) => index + 13),
  ];
  // Bond, debond and what lies between are once for each half of the lot; the first half is bonded first.
  const copied = await copyFlow(scope, flow?.id ?? "", (_em, plan) => {
    const from = plan.steps.findIndex(({ kind }) => kind === "bond");
    const to = plan.steps.findIndex(({ kind }) => kind === "debond");
    const span = plan.steps.slice(from, to + 1);
    const half = (slots: number[]) =>
      span.map((step) => ({
        ...step,
        id: crypto.randomUUID(),
        handling: { ...step.handling, slots },
      }));
    return Promise.resolve({
      plan: {
        ...plan,
        steps: plan.steps.toSpliced(from, span.length, ...half(low), ...half(high)),
      },
      words: "Parted by slot",
    });
  });
  if (copied.outcome !== "saved" || copied.id === null) throw new Error(copied.outcome);
  const ran = await runAssessment(scope, copied.id);
  if (ran.outcome !== "stored") throw new Error(ran.reason);
  const leg = new URLSearchParams({ leg: "2" });
  const { input, catalogue } = await trialGround(scope, ran.id, leg);
  const bonds = input.flow.steps.flatMap(({ kind }, index) => (kind === "bond" ? [index + 1] : []));
  expect(bonds).toHaveLength(2);
  const [, second = 0] = bonds;
  const debonds = input.flow.steps.flatMap(({ kind }, index) => (kind === "debond" ? [index + 1] : []));
  const mounter = catalogue.tools.find(({ kinds }) => kinds.includes("mount on frame"))?.tool.id ?? "";
  const idOf = (list: readonly { id: string; name: string }[], name: string) =>
    list.find((each) => each.name === name)?.id ?? "";
  const changes: FlowChange[] = [
    {
      quantity: "bond",
      step: second,
      carrier: idOf(catalogue.carriers, "Silicon carrier 775 µm"),
      material: idOf(
        catalogue.materials.map(({ material }) => material),
        "Peel adhesive C with release layer",
      ),
      thickness: 40e-6,
    },
    { quantity: "frame", step: (debonds[1] ?? 0) + 1, tool: mounter },
  ];
  for (const change of changes) {
    const { path } = await tryOnCopy(scope, ran.id, JSON.stringify([change]), "2");
    const copy = await trialGround(scope, copyIn(path), leg);
    const expected = applyChange(input.flow, change, catalogue);
    expect(expected).not.toEqual(input.flow);
    const untitled = ({ steps, ...rest }: typeof expected) => ({
      ...rest,
      name: "",
      steps: steps.map((step) => ({ ...step, title: "" })),
    });
    expect(JSON.parse(JSON.stringify(untitled(copy.input.flow)))).toEqual(
      JSON.parse(JSON.stringify(untitled(expected))),
    );
    // The other half of the lot keeps its bond.
    const other = await trialGround(scope, copyIn(path), new URLSearchParams({ leg: "1" }));
    const [first = 0] = bonds;
    expect(other.input.flow.steps[first - 1]?.bond).toEqual(
      (await trialGround(scope, ran.id, new URLSearchParams({ leg: "1" }))).input.flow.steps[first - 1]?.bond,
    );
  }
}, 60_000);

test("a remedy tried on a copy clears what it says, and leaves the flow as it is", async () => {
  const { trialGround, trialQuestion, remediesOf, tryOnCopy, getAssessment } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const id = await assessed(scope, PETREL);
  const before = await asOwner(database, "select version from flow where name = ?", [PETREL]);
  const ground = await trialGround(scope, id);
  const found = await remediesOf(trialQuestion(ground));
  const remedy = found?.cards.find(({ clears }) => clears.some(({ rule, step }) => rule === 2 && step === 10));
  const posted = remedy?.posted ?? "";
  const chosen = ground.catalogue.carriers.find((carrier) => posted.includes(carrier.id));
  const { path } = await tryOnCopy(scope, id, posted);
  expect(path).toContain(`compare?with=${id}`);
  const copy = await getAssessment(scope, copyIn(path));
  expect(copy.result.verdict.outcome).toBe(remedy?.verdict);
  expect(copy.result.steps[9]?.title).toContain(chosen?.name ?? "the carrier of the remedy");
  expect(await asOwner(database, "select version from flow where name = ?", [PETREL])).toEqual(before);
}, 60_000);

test("the finder lists what fits first, and takes a target that is understood", async () => {
  const { finderOf } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const id = await assessed(scope, PETREL);
  const found = await finderOf(scope, id, new URLSearchParams());
  expect(found.fits).toBeGreaterThan(0);
  expect(found.rows?.slice(0, found.fits).every(({ fits }) => fits)).toBe(true);
  expect(found.rows?.filter(({ fits }) => fits).every(({ carrier }) => !carrier.includes("200 mm"))).toBe(true);
  const bad = await finderOf(scope, id, new URLSearchParams({ warp: "12 parsecs", step: "99" }));
  expect(bad.asked.faults).toEqual({
    targetStep: "Choose the step that the target is for.",
    targetWarp: expect.stringContaining("parsecs") as string,
  });
  expect(bad.rows).toHaveLength(found.rows?.length ?? 0);
  const strict = await finderOf(scope, id, new URLSearchParams({ warp: "100 µm", step: "16" }));
  expect(strict.fits).toBeLessThan(found.fits);
}, 60_000);

test("a technician may look and not try; who is not of the program sees nothing; an old assessment is not tried", async () => {
  const { trialGround, tryOnCopy } = await services();
  const engineer = await scopeOfPerson(database, "engineer");
  const id = await assessed(engineer, PETREL);
  const technician = await scopeOfPerson(database, "technician");
  const guest = await scopeOfPerson(database, "guest");
  const change = JSON.stringify([{ quantity: "silicon after", step: 12, value: 54e-6 }]);
  expect(await trialGround(technician, id)).toMatchObject({ barred: "role" });
  await expect(tryOnCopy(technician, id, change)).rejects.toMatchObject({ init: { status: 403 } });
  await expect(trialGround(guest, id)).rejects.toMatchObject({ init: { status: 404 } });
  for (const posted of ["", "[]", "[1]", "{", JSON.stringify([{ quantity: "silicon after", step: 12, value: -1 }])])
    await expect(tryOnCopy(engineer, id, posted)).rejects.toMatchObject({ init: { status: 400 } });
  await asOwner(
    database,
    "update flow_step set peak_temperature = peak_temperature + 1 where kind = 'anneal' and flow_id = (select id from flow where name = ?)",
    [PETREL],
  );
  await expect(tryOnCopy(engineer, id, change)).rejects.toMatchObject({ init: { status: 409 } });
}, 60_000);
