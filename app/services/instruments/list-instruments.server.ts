import type { EntityManager } from "@mikro-orm/postgresql";
import { ImportProfile } from "#app/db/entities/import-profile.ts";
import { ReferenceReading } from "#app/db/entities/reference-reading.ts";
import { RepeatabilityStudy } from "#app/db/entities/repeatability-study.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import type { InstrumentRow } from "#app/schemas/instrument.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { saveImportProfile } from "../import-profiles.server.ts";
import { everyWord } from "../like.server.ts";
import { requireOnSite } from "../permission.server.ts";
import type { Saved } from "../record.server.ts";

/** A page of the site's instruments, searched by name, each with what is known of it. */
export async function listInstruments(scope: ActorScope, params: ListParams): Promise<ListPage<InstrumentRow>> {
  requireOnSite(scope, "see the library");
  return inScope(scope, async (em) => {
    const [records, total] = await em.findAndCount(
      ImportProfile,
      params.query ? everyWord(params.query, (name) => ({ name })) : {},
      {
        orderBy: { name: params.descending ? "desc" : "asc" },
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const known = await newestOf(
      em,
      records.map(({ id }) => id),
    );
    return { rows: records.map(({ id, name }) => ({ id, name, ...known(id) })), total, params };
  });
}

/** The newest study and the newest reading of each instrument. */
async function newestOf(
  em: EntityManager,
  ids: string[],
): Promise<(id: string) => Pick<InstrumentRow, "study" | "checkedOn">> {
  const counts = { profile: { $in: ids }, setAside: null };
  const studies = await em.find(RepeatabilityStudy, counts, { orderBy: { createdAt: "desc", id: "asc" } });
  const readings = await em.find(ReferenceReading, counts, { orderBy: { measuredOn: "desc" } });
  return (id) => {
    const study = studies.find(({ profile }) => profile?.id === id);
    return {
      study: study
        ? {
            forTwo: study.result.forTwo,
            repeats: study.readings.length,
            createdAt: study.createdAt.toISOString(),
          }
        : null,
      checkedOn: readings.find(({ profile }) => profile?.id === id)?.measuredOn ?? null,
    };
  };
}

/** Takes up an instrument by its name; how it writes its files is kept when its first one is imported. */
export async function addInstrument(scope: ActorScope, name: string): Promise<Saved> {
  requireOnSite(scope, "check instruments");
  return saveImportProfile(scope, { id: null, version: null, values: { name, profile: {} } });
}
