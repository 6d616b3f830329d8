import type { MikroORM } from "@mikro-orm/postgresql";
import { runMigrations } from "graphile-worker";
import { QUEUE_SCHEMA } from "./queue-schema.ts";

/**
 * Brings graphile-worker's own tables up to date as the owner, and lets the plain role put jobs in and work them off. Its tables are
 * under row-level security without a policy; what they hold of ours is the id of a job, whose row has the wall.
 */
export async function prepareQueue(orm: MikroORM, ownerUrl: string, role: string): Promise<void> {
  await runMigrations({ connectionString: ownerUrl, schema: QUEUE_SCHEMA });
  const connection = orm.em.fork().getConnection();
  const quoted = `"${role.replaceAll('"', '""')}"`;
  const tables = await connection.execute<{ tablename: string }[]>(
    "select tablename from pg_tables where schemaname = ? and rowsecurity",
    [QUEUE_SCHEMA],
  );
  for (const { tablename } of tables) {
    const table = `"${QUEUE_SCHEMA}"."${tablename}"`;
    await connection.execute(`drop policy if exists application on ${table}`);
    await connection.execute(`create policy application on ${table} to ${quoted} using (true) with check (true)`);
  }
  await connection.execute(`grant usage on schema "${QUEUE_SCHEMA}" to ${quoted}`);
  await connection.execute(
    `grant select, insert, update, delete on all tables in schema "${QUEUE_SCHEMA}" to ${quoted}`,
  );
}
