import { expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { WhatIfChange, WhatIfSnapshot } from "#app/schemas/what-if.ts";

const database = useDatabase({ demo: true });

const services = async () => ({
  ...(await import("#app/services/flows/what-if.server.ts")),
  ...(await import("#app/services/flows/new-flow.server.ts")),
  ...(await import("#app/lib/what-if.ts")),
  ...(await import("#app/lib/what-if-answer.ts")),
});

/** A copy of the Petrel flow on glass 3.0 ppm, which is the test's own. */
async function ownFlow(scope: ActorScope): Promise<string> {
  const { copyFlow } = await services();
  const [petrel] = await asOwner<{ id: string }>(database, "select id from flow where name like '%glass 3.0 ppm'");
  const copied = await copyFlow(scope, petrel?.id ?? "");
  if (copied.outcome !== "saved") throw new Error("not copied");
  return copied.id;
}

/** One change of every kind. */
function allChanges({ stepIds, carriers, materials, input }: WhatIfSnapshot): WhatIfChange[] {
  const at = (kind: string) => stepIds[input.steps.findIndex((step) => step.kind === kind)] ?? "";
  const named = (list: { id: string; name: string }[], name: string) =>
    list.find((each) => each.name === name)?.id ?? "";
  const [bond, plate] = [at("bond"), at("plate")];
  return [
    { step: at("stress relief"), film: null, field: "siliconAfter", value: 80e-6 },
    { step: at("anneal"), film: null, field: "peakTemperature", value: 453.15 },
    { step: at("edge trim"), film: null, field: "planned", value: "thin-wafer gripper" },
    { step: bond, film: null, field: "carrier", value: named(carriers, "Silicon carrier 775 µm") },
    { step: bond, film: null, field: "bondingMaterial", value: named(materials, "Peel adhesive C with release layer") },
    { step: plate, film: 0, field: "filmThickness", value: 3e-6 },
    // The film's own stress stands at the passivation; a what-if makes it the step's.
    { step: at("cure"), film: 0, field: "filmStress", value: 45e6 },
  ];
}

test("the browser's answer to a what-if is the server's once it is applied, to the last digit", async () => {
  const { whatIfSnapshot, applyWhatIf, changedInput, answerOf } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const flowId = await ownFlow(scope);
  const sent = await whatIfSnapshot(scope, flowId);
  // As it arrives in the browser.
  const snapshot = JSON.parse(JSON.stringify(sent)) as WhatIfSnapshot;
  const changes = allChanges(snapshot);
  const inBrowser = changedInput(snapshot, changes);
  const applied = await applyWhatIf(scope, { flowId, version: snapshot.version }, JSON.stringify(changes));
  expect(applied.outcome).toBe("saved");
  const after = await whatIfSnapshot(scope, flowId);
  expect(after.input).toEqual({ ...inBrowser, name: after.input.name });
  expect(answerOf(inBrowser, snapshot.limits)).toEqual(answerOf(after.input, after.limits));
  expect(answerOf(snapshot.input, snapshot.limits)).not.toEqual(answerOf(after.input, after.limits));
}, 30_000);

test("applying is one change that can be taken back, and says what it took", async () => {
  const { whatIfSnapshot, applyWhatIf } = await services();
  const { walkHistory } = await import("#app/services/flows/steps.server.ts");
  const scope = await scopeOfPerson(database, "engineer");
  const flowId = await ownFlow(scope);
  const before = await whatIfSnapshot(scope, flowId);
  await applyWhatIf(scope, { flowId, version: before.version }, JSON.stringify(allChanges(before).slice(0, 2)));
  const [revision] = await asOwner<{ words: string }>(
    database,
    "select words from flow_revision where flow_id = ? order by number desc limit 1",
    [flowId],
  );
  expect(revision?.words).toBe(
    "Took from a what-if: step 12, silicon after it: 80\u00A0µm; step 8, peak temperature: 180\u00A0°C",
  );
  await walkHistory(scope, { flowId, version: before.version + 1 }, "undo");
  expect((await whatIfSnapshot(scope, flowId)).input).toEqual(before.input);
});

test("what no page of ours sends is refused, and so is a technician", async () => {
  const { whatIfSnapshot, applyWhatIf } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const flowId = await ownFlow(scope);
  const { version, stepIds } = await whatIfSnapshot(scope, flowId);
  const post = (posted: unknown) => applyWhatIf(scope, { flowId, version }, JSON.stringify(posted));
  const place = { step: stepIds[0], film: null };
  for (const posted of [
    "{",
    [],
    [{ ...place, field: "siliconAfter", value: -5 }],
    [{ ...place, field: "planned", value: "a string" }],
    [{ ...place, field: "title", value: "x" }],
  ])
    await expect(post(posted)).rejects.toMatchObject({ init: { status: 400 } });
  const technician = await scopeOfPerson(database, "technician");
  await expect(whatIfSnapshot(technician, flowId)).rejects.toMatchObject({ init: { status: 403 } });
  const guest = await scopeOfPerson(database, "guest");
  await expect(whatIfSnapshot(guest, flowId)).rejects.toMatchObject({ init: { status: 404 } });
});
