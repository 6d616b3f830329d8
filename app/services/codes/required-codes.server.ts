import { LockMode } from "@mikro-orm/postgresql";
import { SiteSetting } from "#app/db/entities/site-setting.ts";
import type { Role } from "#app/policies/roles.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireRecentProof } from "../people/recent-proof.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { touch } from "../record.server.ts";

const EDIT = "edit site settings";

/** The roles whose holders sign in with a one-time code as well. */
export async function codesRequiredFor(scope: ActorScope): Promise<Role[]> {
  requireOnSite(scope, EDIT);
  return inScope(scope, async (em) => (await em.findAll(SiteSetting))[0]?.codesFor ?? []);
}

/**
 * Says which roles sign in with a one-time code as well. Whoever holds one and has no codes sets them up next, whatever they do; nothing is
 * written when it says the same as before.
 */
export async function saveCodesRequired(scope: ActorScope, roles: readonly Role[]): Promise<void> {
  requireOnSite(scope, EDIT);
  requireRecentProof(scope);
  await inScope(scope, async (em) => {
    const [row] = await em.findAll(SiteSetting, { lockMode: LockMode.PESSIMISTIC_WRITE });
    if (!row) throw new Error("the row of the site's settings, which a migration puts in, is gone");
    const wanted = [...new Set(roles)].toSorted();
    if (wanted.join() === [...row.codesFor].toSorted().join()) return;
    row.codesFor = wanted;
    touch(row, scope);
    await em.flush();
  });
}
