import { MikroORM } from "@mikro-orm/postgresql";
import { environment } from "#app/server/environment.server.ts";
import { databaseOptions } from "./options.ts";
import { refusePowerfulRole } from "./refuse-powerful-role.ts";

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

/** Closes the pool; used when the process ends. */
export async function closeOrm(): Promise<void> {
  const connected = await kept.planewardOrm;
  kept.planewardOrm = undefined;
  await connected?.close();
}
