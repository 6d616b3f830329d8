import type { MikroORM } from "@mikro-orm/postgresql";

/**
 * Closes the connection and throws when its role owns the tables or may pass row-level security by: that binds only a plain role.
 */
export async function refusePowerfulRole(connected: MikroORM): Promise<void> {
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
