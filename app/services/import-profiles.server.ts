import { ImportProfile } from "#app/db/entities/import-profile.ts";
import type { ImportProfileRow, ImportProfileValues } from "#app/schemas/import-profile.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "./permission.server.ts";
import { conflictOf, saveNamedRecord, saving, stampOf, type Saved } from "./record.server.ts";
import { idFrom } from "./uuid.server.ts";

/** The import profiles of the site's instruments, by name. */
export async function listImportProfiles(scope: ActorScope): Promise<ImportProfileRow[]> {
  requireOnSite(scope, "keep import profiles");
  return inScope(scope, async (em) => {
    const profiles = await em.findAll(ImportProfile, { populate: ["updatedBy"], orderBy: { name: "asc" } });
    return profiles.map((record) => ({
      id: record.id,
      name: record.name,
      profile: record.profile,
      stamp: stampOf(record),
    }));
  });
}

/**
 * The import profile of one instrument.
 * @throws 403 for a role that may not, 404 when the id names nothing
 */
export async function getImportProfile(scope: ActorScope, id: string): Promise<ImportProfileValues["profile"]> {
  requireOnSite(scope, "keep import profiles");
  return inScope(scope, async (em) => {
    const record = await em.findOne(ImportProfile, { id: idFrom(id, "import profile") });
    if (!record) throw notFound("import profile");
    return record.profile;
  });
}

/**
 * Keeps an instrument's import profile, or changes it. A name that another has, and a version that is no longer current, are
 * answered and nothing is written.
 * @throws 403 for a role that may not, 404 when the id names nothing
 */
export async function saveImportProfile(
  scope: ActorScope,
  { id, version, values }: { id: string | null; version: number | null; values: ImportProfileValues },
): Promise<Saved> {
  requireOnSite(scope, "keep import profiles");
  const record = { id: id === null ? null : idFrom(id, "import profile"), version, values };
  return saving(() =>
    inScope(scope, (em) => saveNamedRecord(em, ImportProfile as never, "import profile", scope, record)),
  );
}

/**
 * Removes an instrument's import profile; what was read by it stays as it is.
 * @throws 403 for a role that may not, 404 when the id names nothing
 */
export async function removeImportProfile(scope: ActorScope, id: string, version: number | null): Promise<Saved> {
  requireOnSite(scope, "keep import profiles");
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const record = await em.findOne(ImportProfile, { id: idFrom(id, "import profile") }, { populate: ["updatedBy"] });
      if (!record) throw notFound("import profile");
      const conflict = conflictOf(record, version);
      if (conflict) return { outcome: "conflict", conflict };
      em.remove(record);
      await em.flush();
      return { outcome: "saved", id: record.id };
    }),
  );
}
