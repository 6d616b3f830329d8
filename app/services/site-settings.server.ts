import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { SiteSetting } from "#app/db/entities/site-setting.ts";
import { PAPERS, paperAskedFor, type Paper } from "#app/lib/paper-size.ts";
import type { SiteSettingValues } from "#app/schemas/site-setting.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "./permission.server.ts";
import { stampOf, touch } from "./record.server.ts";

const EDIT = "edit site settings";

async function theRow(em: EntityManager, lockMode: LockMode.NONE | LockMode.PESSIMISTIC_WRITE = LockMode.NONE) {
  const [row] = await em.findAll(SiteSetting, { lockMode });
  if (!row) throw new Error("the row of the site's settings, which a migration puts in, is gone");
  await em.populate(row, ["updatedBy"]);
  return row;
}

/** What holds for the whole site, with who changed it last. */
export async function siteSettings(scope: ActorScope) {
  requireOnSite(scope, EDIT);
  return inScope(scope, async (em) => {
    const row = await theRow(em);
    return { paper: row.paper, stamp: stampOf(row) };
  });
}

/** The paper that an address asks for, and the site's where it asks for none. Everybody who is signed in may print. */
export async function paperFor(scope: ActorScope, url: URL): Promise<Paper> {
  const asked = paperAskedFor(url.searchParams.get("paper"));
  return asked ?? (await inScope(scope, (em) => theRow(em))).paper;
}

/** `refused`: somebody else has changed it since; `version` is that of theirs, to send along when the person saves over it. */
export type SettingsSaved = { outcome: "saved" } | { outcome: "refused"; reason: string; version: number };

/** Saves what holds for the whole site; nothing is written when it says the same as before. */
export async function saveSiteSettings(
  scope: ActorScope,
  { paper, version }: SiteSettingValues,
): Promise<SettingsSaved> {
  requireOnSite(scope, EDIT);
  return inScope(scope, async (em): Promise<SettingsSaved> => {
    const row = await theRow(em, LockMode.PESSIMISTIC_WRITE);
    if (row.paper === paper) return { outcome: "saved" };
    if (row.version !== version) {
      const { updatedBy, updatedAt } = stampOf(row);
      const at = updatedAt.slice(0, 16).replace("T", " ");
      const reason = `${updatedBy} saved these settings, with ${PAPERS[row.paper].name} as the paper, at ${at} UTC, after you had opened this page. Save again to put yours in its place.`;
      return { outcome: "refused", reason, version: row.version };
    }
    row.paper = paper;
    touch(row, scope);
    await em.flush();
    return { outcome: "saved" };
  });
}
