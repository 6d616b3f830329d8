import { raw, ReferenceKind, wrap } from "@mikro-orm/postgresql";
import type { EntityName } from "@mikro-orm/core";
import { PAGE_SIZE, readListParams, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import type { LibraryKey } from "#app/schemas/library-records.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { saveNamedRecord, saving, stampOf, type Saved } from "../record.server.ts";
import { everyWord } from "../like.server.ts";
import { idFrom } from "../uuid.server.ts";
import { LIBRARY, type LibraryRecord } from "./kinds.server.ts";

/** The entity as the generic code sees it: a named record. */
interface NamedRecord {
  id: string;
  name: string;
  version: number;
  createdAt: Date;
  updatedAt: Date;
  updatedBy?: { id: string; name: string } | null;
}

const entityOf = (key: LibraryKey) => LIBRARY[key].entity as unknown as EntityName<NamedRecord>;

const ABOUT_THE_RECORD = new Set(["createdAt", "createdBy", "updatedAt", "updatedBy", "version"]);

/** The plain columns of an entity, without those about the record. */
function plain<Key extends LibraryKey>(key: Key, entity: NamedRecord): LibraryRecord<Key> {
  const columns = wrap(entity, true).__meta.props.filter(
    ({ kind, name }) => kind === ReferenceKind.SCALAR && !ABOUT_THE_RECORD.has(name),
  );
  const values = entity as unknown as Record<string, unknown>;
  return Object.fromEntries(columns.map(({ name }) => [name, values[name] ?? null])) as unknown as LibraryRecord<Key>;
}

/** A page of a library list; searched by name, filtered and sorted in the database. */
export async function listLibrary<Key extends LibraryKey>(
  scope: ActorScope,
  key: Key,
  params: ListParams,
): Promise<ListPage<LibraryRecord<Key>>> {
  requireOnSite(scope, "see the library");
  const { sorts, filters } = LIBRARY[key];
  const sort = (sorts as Record<string, string>)[params.sort] ?? sorts.name;
  return inScope(scope, async (em) => {
    const where: Record<string, unknown> = {};
    if (params.query)
      Object.assign(
        where,
        everyWord(params.query, (name) => ({ name })),
      );
    for (const [filter, condition] of Object.entries<(value: string) => object | null>(filters))
      if (params.filters[filter]) Object.assign(where, condition(params.filters[filter]));
    const [rows, total] = await em.findAndCount(entityOf(key), where as never, {
      orderBy: [{ [raw(sort)]: params.descending ? "desc nulls last" : "asc nulls last" }, { id: "asc" }] as never,
      limit: PAGE_SIZE,
      offset: (params.page - 1) * PAGE_SIZE,
    });
    return { rows: rows.map((row) => plain(key, row)), total, params };
  });
}

/** The page of a library list that an address asks for, and whether this person may add to the list. */
export async function listLibraryAt<Key extends LibraryKey>(
  scope: ActorScope,
  key: Key,
  search: URLSearchParams,
): Promise<{ page: ListPage<LibraryRecord<Key>>; mayEdit: boolean }> {
  const { sorts, filters, edit } = LIBRARY[key];
  const params = readListParams(search, { sorts: Object.keys(sorts), filters: Object.keys(filters) });
  return { page: await listLibrary(scope, key, params), mayEdit: mayOnSite(scope.actor, edit) };
}

/** Everything of a kind, by name, for choices in forms. */
export async function allOfLibrary<Key extends LibraryKey>(scope: ActorScope, key: Key): Promise<LibraryRecord<Key>[]> {
  requireOnSite(scope, "see the library");
  return inScope(scope, async (em) => {
    const rows = await em.find(entityOf(key), {}, { orderBy: { name: "asc" } as never });
    return rows.map((row) => plain(key, row));
  });
}

/** One record with who changed it last and whether this person may. */
export async function getLibraryRecord<Key extends LibraryKey>(
  scope: ActorScope,
  key: Key,
  id: string | undefined,
): Promise<{ record: LibraryRecord<Key>; stamp: RecordStamp; mayEdit: boolean }> {
  requireOnSite(scope, "see the library");
  const { what, edit } = LIBRARY[key];
  return inScope(scope, async (em) => {
    const entity = await em.findOne(entityOf(key), { id: idFrom(id, what) }, { populate: ["updatedBy"] as never });
    if (!entity) throw notFound(what);
    return { record: plain(key, entity), stamp: stampOf(entity), mayEdit: mayOnSite(scope.actor, edit) };
  });
}

/** Adds or changes a record of the library. */
export async function saveLibraryRecord(
  scope: ActorScope,
  key: LibraryKey,
  input: { id: string | null; version: number | null; values: { name: string } & Record<string, unknown> },
): Promise<Saved> {
  const { what, edit } = LIBRARY[key];
  requireOnSite(scope, edit);
  return saving(() => inScope(scope, (em) => saveNamedRecord(em, entityOf(key) as never, what, scope, input)));
}
