import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { CsvMark } from "#app/lib/csv.ts";
import { DEFAULT_PREFERENCES, type Preferences } from "#app/lib/preferences.ts";
import type { Mine, SavedFilterRow } from "#app/schemas/kept.ts";
import { preferencesSchema } from "#app/schemas/preference.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";

interface Row {
  preferences: unknown;
  favourites: string[];
  filters: SavedFilterRow[];
}

/** What every page needs to know of the person, in one query. */
export async function mineOf(scope: ActorScope): Promise<Mine> {
  const { id } = scope.actor;
  const [row] = await inScope(scope, (em) =>
    em.execute<Row[]>(
      `select (select value from preference where person_id = ?) as preferences,
              (select coalesce(json_agg(kind || ' ' || record_id), '[]') from favourite where person_id = ?) as favourites,
              (select coalesce(json_agg(json_build_object('id', id, 'list', list, 'name', name, 'query', query)
                                        order by lower(name)), '[]')
                 from saved_filter where person_id = ?) as filters`,
      [id, id, id],
    ),
  );
  return {
    preferences: preferencesOf(row?.preferences ?? null),
    favourites: row?.favourites ?? [],
    filters: row?.filters ?? [],
  };
}

/** Preferences as stored; as delivered where nothing is. */
function preferencesOf(stored: unknown): Preferences {
  return preferencesSchema.safeParse(stored ?? {}).data ?? DEFAULT_PREFERENCES;
}

/** How the person wants pages that stand outside of the frame, such as a sheet on the screen. */
export async function preferencesFor(scope: ActorScope): Promise<Preferences> {
  return (await mineOf(scope)).preferences;
}

/** How the person wants figures in a file for a spreadsheet. */
export async function csvMarkOf(scope: ActorScope): Promise<CsvMark> {
  return (await preferencesFor(scope)).decimalMark;
}

/** Keeps the preferences of the person. */
export async function savePreferences(scope: ActorScope, value: Preferences): Promise<void> {
  await inScope(scope, (em: EntityManager) =>
    em.execute(
      `insert into preference (id, person_id, value, at) values (?, ?, ?::jsonb, clock_timestamp())
         on conflict (person_id) do update set value = excluded.value, at = excluded.at`,
      [randomUUID(), scope.actor.id, JSON.stringify(value)],
    ),
  );
}
