import { expect, test } from "vitest";
import { asOwner, useDatabase } from "./test-database.ts";

const database = useDatabase();

test("migrations make exactly the tables that the entities describe", async () => {
  const difference = await database.owner.schema.getUpdateSchemaSQL({ wrap: false });
  expect(difference.trim()).toBe("");
});

test("every migration can be taken back and made again", async () => {
  await database.owner.migrator.down({ to: 0 });
  const left = await asOwner<{ tablename: string }>(
    database,
    "select tablename from pg_tables where schemaname = 'public' and tablename <> 'mikro_orm_migrations'",
  );
  expect(left).toEqual([]);
  await database.owner.migrator.up();
  expect((await database.owner.schema.getUpdateSchemaSQL({ wrap: false })).trim()).toBe("");
});
