import type { EntityManager } from "@mikro-orm/postgresql";
import { Film } from "#app/db/entities/film.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { filmChanges } from "#app/lib/film-csv/changes.ts";
import { faultPlace, formOfCells } from "#app/lib/film-csv/form.ts";
import { readFilmTable, type FilmLine } from "#app/lib/film-csv/read.ts";
import { textCellsOf } from "#app/lib/film-csv/write.ts";
import { filmSchema, type FilmValues } from "#app/schemas/film.ts";
import type { FilmImported, FilmImportPlan } from "#app/schemas/film-import.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { whereUsed } from "../library/use.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { saveNamedRecord } from "../record.server.ts";

/** The films that a table would add or change, with their values. */
interface Plan extends FilmImportPlan {
  /** ids of the films that the library has */
  stored: ReadonlySet<string>;
  values: Map<number, FilmValues>;
}

/**
 * What a table of films would do to the library, without doing it.
 * @throws 403 for a role that may not edit films
 */
export async function planFilmImport(scope: ActorScope, text: string): Promise<FilmImported> {
  requireOnSite(scope, "edit films");
  const imported = await inScope(scope, async (em): Promise<FilmImported> => {
    const plan = await planOf(em, text);
    return typeof plan === "string" ? { outcome: "refused", reason: plan } : shown(plan, null);
  });
  return withUses(scope, imported);
}

/** How many stacks and flows of the person's own programs each film to be changed is used in. */
async function withUses(scope: ActorScope, imported: FilmImported): Promise<FilmImported> {
  if (imported.outcome !== "plan") return imported;
  for (const film of imported.plan.changed) film.uses = (await whereUsed(scope, "film", film.id)).length;
  return imported;
}

/**
 * Adds and changes the films of a table, all of them in one transaction, as the plan that was seen says. Rows with faults are left
 * out. Films that somebody changed since the plan was seen are a conflict, and nothing is written.
 * @param seen version of each film to be changed, by its id
 * @throws 403 for a role that may not edit films
 */
export async function applyFilmImport(
  scope: ActorScope,
  text: string,
  seen: ReadonlyMap<string, number>,
): Promise<FilmImported> {
  requireOnSite(scope, "edit films");
  const imported = await inScope(scope, async (em): Promise<FilmImported> => {
    const plan = await planOf(em, text);
    if (typeof plan === "string") return { outcome: "refused", reason: plan };
    const moved = plan.changed.filter(({ id, version }) => seen.get(id) !== version).map(({ name }) => name);
    if (moved.length > 0)
      return shown(plan, `Somebody saved ${moved.join(", ")} since you looked. Look at the changes again.`);
    if ([...seen.keys()].some((id) => !plan.stored.has(id)))
      return shown(plan, "A film of this table was removed since you looked. Look at the changes again.");
    for (const { row, id, version } of plan.changed) await save(em, scope, plan, row, { id, version });
    for (const { row } of plan.added) await save(em, scope, plan, row, { id: null, version: null });
    return { outcome: "done", added: plan.added.length, changed: plan.changed.length };
  });
  return withUses(scope, imported);
}

async function save(
  em: EntityManager,
  scope: ActorScope,
  { values }: Plan,
  row: number,
  record: { id: string | null; version: number | null },
) {
  const film = values.get(row);
  if (!film) throw new Error("a planned row has values");
  const saved = await saveNamedRecord(em, Film as never, "film", scope, { ...record, values: film });
  // All that can come between is looked at in the same transaction.
  if (saved.outcome !== "saved") throw new Error(`a planned film was not saved: ${saved.outcome}`);
}

const shown = ({ values: _values, stored: _stored, ...plan }: Plan, conflict: string | null): FilmImported => ({
  outcome: "plan",
  plan,
  conflict,
});

async function planOf(em: EntityManager, text: string): Promise<Plan | string> {
  const table = readFilmTable(text);
  if (typeof table === "string") return table;
  const films = new Map((await em.find(Film, {})).map((film) => [film.name, film]));
  const stored = new Set([...films.values()].map(({ id }) => id));
  const plan: Plan = {
    ...{ text, added: [], changed: [], same: 0, refused: [], unread: table.unread },
    values: new Map(),
    stored,
  };
  const rows = new Map<string, number>();
  for (const line of table.lines) {
    const { row, name } = line;
    const earlier = rows.get(name);
    rows.set(name, row);
    const film = films.get(name);
    const read = filmSchema.safeParse(formOfCells(merged(line, film)));
    if (earlier !== undefined || !read.success) {
      const twice = earlier === undefined ? [] : [`stands in row ${earlier} already`];
      plan.refused.push({
        row,
        name: excerpt(name, 80),
        reasons: [...twice, ...(read.success ? [] : faults(read.error))],
      });
      continue;
    }
    if (!film) plan.added.push({ row, name });
    else {
      const changes = filmChanges(film, read.data);
      if (changes.length === 0) {
        plan.same += 1;
        continue;
      }
      const { id, version } = film;
      plan.changed.push({ row, id, name, version, changes, uses: 0 });
    }
    plan.values.set(row, read.data);
  }
  return plan;
}

/** The line over what is stored: a column that the table leaves out stays as it is. */
const merged = ({ cells }: FilmLine, stored: Film | undefined) =>
  stored ? new Map([...textCellsOf(stored), ...cells]) : cells;

const faults = (error: { issues: { path: PropertyKey[]; message: string }[] }) =>
  error.issues.map(({ path, message }) => `${faultPlace(path)}: ${message}`);
