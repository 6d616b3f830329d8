import { beforeAll, expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { LimitKey } from "#app/engine/rules/limits.ts";
import type { LimitChange } from "#app/schemas/site-limit.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

const database = useDatabase({ demo: true });

const limits = () => import("#app/services/limits.server.ts");

// The first import reads the whole server: that is no test's time.
beforeAll(async () => void (await limits()), 60_000);

/** A limit as a form sends it back: as it stands now, but for what is changed. Values in SI. */
async function change(scope: ActorScope, key: LimitKey, changed: Partial<Pick<LimitChange, "value" | "source">>) {
  const { groups } = await (await limits()).listLimits(scope);
  const row = groups.flatMap((group) => group.limits).find((limit) => limit.key === key);
  if (!row) throw new Error(`no such limit: ${key}`);
  const { value, source, version } = row;
  return { value, source, ...changed, opened: { version, value, source } };
}

test("a change is saved with its source, leaves a trail, and is what the rules judge by from then on", async () => {
  const { saveLimits, siteLimits } = await limits();
  const owner = await scopeOfPerson(database, "process-owner");
  const bareFrom200 = await change(owner, "bareFrom200", { value: 310e-6, source: "trial of lot 12" });
  expect(await saveLimits(owner, { bareFrom200 })).toEqual({ outcome: "saved" });
  expect((await siteLimits(owner)).bareFrom200).toEqual({ value: 310e-6, source: "trial of lot 12" });
  const trail = await asOwner<{ field: string; actor_id: string }>(
    database,
    "select field, actor_id from audit_event where subject = 'limit' and action = 'changed' order by field",
  );
  expect(trail).toEqual([
    { field: "source", actor_id: owner.actor.id },
    { field: "value", actor_id: owner.actor.id },
  ]);
});

test("what the person did not touch is left as somebody else has set it", async () => {
  const { saveLimits, siteLimits } = await limits();
  const [owner, administrator] = [
    await scopeOfPerson(database, "process-owner"),
    await scopeOfPerson(database, "administrator"),
  ];
  const seen = await change(owner, "edgeRingFrom", {});
  await saveLimits(administrator, { edgeRingFrom: await change(administrator, "edgeRingFrom", { value: 80e-6 }) });
  const flatWithin = await change(owner, "flatWithin", { value: 20e-6 });
  expect(await saveLimits(owner, { edgeRingFrom: seen, flatWithin })).toEqual({ outcome: "saved" });
  expect((await siteLimits(owner)).edgeRingFrom.value).toBe(80e-6);
});

test("a limit that somebody else has changed is a conflict at its field, and nothing is saved", async () => {
  const { saveLimits, siteLimits } = await limits();
  const [owner, administrator] = [
    await scopeOfPerson(database, "process-owner"),
    await scopeOfPerson(database, "administrator"),
  ];
  const adhesiveMargin = await change(owner, "adhesiveMargin", { value: 25 });
  const warpMargin = await change(owner, "warpMargin", { value: 0.3 });
  await saveLimits(administrator, { adhesiveMargin: await change(administrator, "adhesiveMargin", { value: 15 }) });
  const refused = await saveLimits(owner, { adhesiveMargin, warpMargin });
  if (refused.outcome !== "refused") throw new Error("not refused");
  expect(refused.errors["adhesiveMargin.value"]?.[0]).toContain(`${administrator.actor.name} set this to 15\u00A0K`);
  expect((await siteLimits(owner)).warpMargin.value).toBe(0.2);
  const again = { ...adhesiveMargin, opened: refused.opened.adhesiveMargin ?? adhesiveMargin.opened };
  expect(await saveLimits(owner, { adhesiveMargin: again })).toEqual({ outcome: "saved" });
});

test("limits that would contradict each other are refused by name, with what has been saved meanwhile", async () => {
  const { saveLimits } = await limits();
  const owner = await scopeOfPerson(database, "process-owner");
  const gripperFrom300 = await change(owner, "gripperFrom300", { value: 460e-6 });
  const refused = await saveLimits(owner, { gripperFrom300 });
  expect(refused).toMatchObject({
    outcome: "refused",
    errors: {
      "gripperFrom300.value": [
        "460\u00A0µm is more than “300 mm wafer: bare from”, 450\u00A0µm: it must be at most that.",
      ],
    },
  });
  const bareFrom300 = await change(owner, "bareFrom300", { value: 470e-6 });
  expect(await saveLimits(owner, { gripperFrom300, bareFrom300 })).toEqual({ outcome: "saved" });
});

test("two people who bring about a contradiction together are told apart by the lock", async () => {
  const { saveLimits } = await limits();
  const [owner, administrator] = [
    await scopeOfPerson(database, "process-owner"),
    await scopeOfPerson(database, "administrator"),
  ];
  const lower = await change(owner, "bareFrom150", { value: 180e-6 });
  const higher = await change(administrator, "gripperFrom150", { value: 200e-6 });
  const outcomes = await Promise.all([
    saveLimits(owner, { bareFrom150: lower }),
    saveLimits(administrator, { gripperFrom150: higher }),
  ]);
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(["refused", "saved"]);
});

test("engineers read the limits, technicians too, guests do not; only those who keep them may change them", async () => {
  const { listLimits, saveLimits } = await limits();
  for (const account of ["engineer", "technician", "shift-lead"]) {
    const scope = await scopeOfPerson(database, account);
    expect((await listLimits(scope)).mayEdit).toBe(false);
    await expect(saveLimits(scope, {})).rejects.toMatchObject({ init: { status: 403 } });
  }
  await expect(listLimits(await scopeOfPerson(database, "guest"))).rejects.toMatchObject({ init: { status: 403 } });
});
