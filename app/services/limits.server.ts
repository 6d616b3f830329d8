import type { EntityManager } from "@mikro-orm/postgresql";
import { SiteLimit } from "#app/db/entities/site-limit.ts";
import { defaultLimits, type SiteLimits } from "#app/engine/rules/limits.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";

/** The site's limits within a transaction that is already open. */
export async function readLimits(em: EntityManager): Promise<SiteLimits> {
  const limits = defaultLimits();
  for (const { key, value, source } of await em.findAll(SiteLimit)) if (key in limits) limits[key] = { value, source };
  return limits;
}

/** The site's limits; a guest, who may not see them, gets the delivered ones. */
export async function siteLimits(scope: ActorScope): Promise<SiteLimits> {
  return inScope(scope, readLimits);
}
