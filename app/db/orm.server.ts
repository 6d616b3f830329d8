import { MikroORM } from "@mikro-orm/postgresql";
import { environment } from "#app/server/environment.server.ts";
import { databaseOptions } from "./options.ts";

/** Kept on globalThis so that an edit in development finds the pool of the module before it instead of opening another. */
const kept = globalThis as { planewardOrm?: Promise<MikroORM> };

/** The ORM of this process, connected as the plain role. */
export function orm(): Promise<MikroORM> {
  kept.planewardOrm ??= connect();
  return kept.planewardOrm;
}

async function connect(): Promise<MikroORM> {
  const connected = await MikroORM.init(databaseOptions(environment.DATABASE_URL));
  await refusePowerfulRole(connected);
  return connected;
}

/** Row-level security binds only a role that neither owns the tables nor may pass them by. */
async function refusePowerfulRole(connected: MikroORM): Promise<void> {
  const [role] = await connected.em
    .fork()
    .getConnection()
    .execute<{ powerful: boolean }[]>(
      `select rolsuper or rolbypassrls or exists (
         select 1 from pg_tables where schemaname = 'public' and tableowner = current_user) as powerful
       from pg_roles where rolname = current_user`,
    );
  if (role?.powerful === false) return;
  await connected.close();
  throw new Error(
    "DATABASE_URL names a role that owns the tables or bypasses row-level security; give a plain role, and the owner in DATABASE_OWNER_URL.",
  );
}

/** Closes the pool; used when the process ends. */
export async function closeOrm(): Promise<void> {
  const connected = await kept.planewardOrm;
  kept.planewardOrm = undefined;
  await connected?.close();
}
