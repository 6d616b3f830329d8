import { expect, test } from "vitest";
import { asOwner, useDatabase } from "./test-database.ts";

const database = useDatabase({ demo: true });

const writtenDown = () =>
  asOwner<{ id: string; kind: string }>(database, "select id, kind from demo_record order by kind, id");

test("a demo from before it was written down is told by the trail of its making", async () => {
  const before = await writtenDown();
  expect(new Set(before.map(({ kind }) => kind))).toContain("wafer_measurement");
  await database.owner.migrator.down({ to: "2026-12-08-found-quickly" });
  // What somebody has made since is not of the demo.
  const [{ id } = { id: "" }] = await asOwner<{ id: string }>(database, "select id from stack limit 1");
  await asOwner(
    database,
    `insert into stack select (jsonb_populate_record(s, jsonb_build_object('id', gen_random_uuid(), 'name', 'Own'))).* from stack s where id = ?`,
    [id],
  );
  await database.owner.migrator.up();
  expect(await writtenDown()).toEqual(before);
});
