import type { EntityManager } from "@mikro-orm/postgresql";
import { needsCodes, type CodesState } from "#app/policies/codes.ts";
import type { Actor, Role } from "#app/policies/roles.ts";

/** Whether the person signs in with codes, or has to and has none; in a transaction that was told of the person. */
export async function codesStateOf(em: EntityManager, actor: Actor): Promise<CodesState> {
  const [row] = await em.execute<{ has: boolean; codes_for: Role[] | null }[]>(
    `select exists (select 1 from one_time_codes where person_id = ? and confirmed_at is not null) as has,
            (select codes_for from site_setting) as codes_for`,
    [actor.id],
  );
  if (row?.has) return "on";
  return needsCodes(actor, row?.codes_for ?? []) ? "missing" : "off";
}
