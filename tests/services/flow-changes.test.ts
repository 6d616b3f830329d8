import { expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

const database = useDatabase({ demo: true });

const services = async () => ({
  ...(await import("#app/services/flows/steps.server.ts")),
  ...(await import("#app/services/flows/flows.server.ts")),
  ...(await import("#app/services/flows/new-flow.server.ts")),
});

/** A copy of the Tern flow, which is the test's own. */
async function ownFlow(scope: ActorScope): Promise<string> {
  const { copyFlow } = await services();
  const [tern] = await asOwner<{ id: string }>(
    database,
    "select id from flow where name like 'Tern%' order by created_at limit 1",
  );
  const copied = await copyFlow(scope, tern?.id ?? "");
  if (copied.outcome !== "saved") throw new Error("not copied");
  return copied.id;
}

async function stateOf(scope: ActorScope, flowId: string) {
  const { getFlow } = await services();
  const { steps, stamp, name } = await getFlow(scope, flowId);
  return { steps, titles: steps.map(({ title }) => title), version: stamp.version, name };
}

test("what was done is taken back and done again, step for step, down to the films", async () => {
  const { changeStep, walkHistory } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const flowId = await ownFlow(scope);
  const start = await stateOf(scope, flowId);
  const third = start.steps[2];
  if (!third) throw new Error("no third step");
  await changeStep(scope, { flowId, version: start.version, stepId: third.id }, { kind: "remove" });
  const removed = await stateOf(scope, flowId);
  expect(removed.titles).toEqual(start.titles.toSpliced(2, 1));
  await changeStep(
    scope,
    { flowId, version: removed.version, stepId: removed.steps[0]?.id ?? "" },
    { kind: "to", number: 5 },
  );
  const undo = async () => walkHistory(scope, { flowId, version: (await stateOf(scope, flowId)).version }, "undo");
  await undo();
  expect((await stateOf(scope, flowId)).titles).toEqual(removed.titles);
  await undo();
  const back = await stateOf(scope, flowId);
  expect(back.steps).toEqual(start.steps);
  // There is nothing more to take back: nothing changes, and nothing is noted.
  expect(await undo()).toEqual({ outcome: "saved", id: null });
  expect((await stateOf(scope, flowId)).version).toBe(back.version);
  await walkHistory(scope, { flowId, version: back.version }, "redo");
  expect((await stateOf(scope, flowId)).titles).toEqual(removed.titles);
}, 30_000);

test("every change keeps the whole plan, so that nothing acknowledged is lost", async () => {
  const { changeStep } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const flowId = await ownFlow(scope);
  const { version, steps, titles } = await stateOf(scope, flowId);
  await changeStep(scope, { flowId, version, stepId: steps[0]?.id ?? "" }, { kind: "copy" });
  const rows = await asOwner<{ number: number; kind: string; words: string; flow_version: number; titles: string[] }>(
    database,
    `select number, kind, words, flow_version, jsonb_path_query_array(plan, '$.steps[*].title') as titles
       from flow_revision where flow_id = ? order by number`,
    [flowId],
  );
  expect(rows).toMatchObject([
    { number: 1, kind: "start", titles },
    { number: 2, kind: "edit", words: expect.stringMatching(/^Copied step 1/), flow_version: version + 1 },
  ]);
  expect((await stateOf(scope, flowId)).version).toBe(version + 1);
});

test("somebody who was slower is told what was done, and may still put their step in its place", async () => {
  const { changeStep, saveStep } = await services();
  const [engineer, owner] = [await scopeOfPerson(database, "engineer"), await scopeOfPerson(database, "process-owner")];
  const flowId = await ownFlow(engineer);
  const { version, steps } = await stateOf(engineer, flowId);
  const step = steps[1];
  if (!step) throw new Error("no second step");
  await changeStep(owner, { flowId, version, stepId: step.id }, { kind: "remove" });
  const { id: _id, films: _films, equipment: _tool, ...typed } = step;
  const values = {
    ...typed,
    title: "Mine",
    equipment: null,
    carrier: null,
    bondingMaterial: null,
    tape: null,
    films: [],
  };
  const place = { flowId, stepId: step.id, position: 0 };
  const refused = await saveStep(engineer, { ...place, version }, values);
  expect(refused).toMatchObject({
    outcome: "conflict",
    conflict: {
      by: owner.actor.name,
      version: version + 1,
      step: "removed",
      changes: [expect.stringMatching(/^Removed step 2/)],
    },
  });
  const kept = await saveStep(engineer, { ...place, version: version + 1 }, values);
  expect(kept).toEqual({ outcome: "saved", id: step.id });
  expect((await stateOf(engineer, flowId)).titles[1]).toBe("Mine");
});

test("two changes at the same moment: one is made, the other is told", async () => {
  const { changeStep } = await services();
  const scope = await scopeOfPerson(database, "engineer");
  const flowId = await ownFlow(scope);
  const { version, steps } = await stateOf(scope, flowId);
  const move = (index: number) =>
    changeStep(scope, { flowId, version, stepId: steps[index]?.id ?? "" }, { kind: "down" });
  const outcomes = await Promise.all([move(0), move(4), move(8)]);
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(["conflict", "conflict", "saved"]);
});

test("a technician changes nothing, and a flow of another program is not there", async () => {
  const { changeStep, walkHistory } = await services();
  const engineer = await scopeOfPerson(database, "engineer");
  const flowId = await ownFlow(engineer);
  const { version, steps } = await stateOf(engineer, flowId);
  const stepId = steps[0]?.id ?? "";
  const technician = await scopeOfPerson(database, "technician");
  await expect(changeStep(technician, { flowId, version, stepId }, { kind: "remove" })).rejects.toMatchObject({
    init: { status: 403 },
  });
  await expect(walkHistory(technician, { flowId, version }, "undo")).rejects.toMatchObject({ init: { status: 403 } });
  const guest = await scopeOfPerson(database, "guest");
  await expect(walkHistory(guest, { flowId, version }, "undo")).rejects.toMatchObject({ init: { status: 404 } });
});
