import type { EntityManager } from "@mikro-orm/postgresql";
import type { InputChange } from "#app/schemas/assessment-changes.ts";
import { KEPT_KINDS, KEPT_RECORDS } from "./kept-records.ts";

/** Ids of those who saved last, since then, what the changes come from. Empty as soon as a save names nobody. */
export async function saversOf(
  em: EntityManager,
  changes: readonly InputChange[],
  flowId: string,
  since: Date,
): Promise<string[]> {
  const savers = new Set<string | null>();
  const ask = async (table: string, column: string, keys: string[]) => {
    if (keys.length === 0) return;
    const rows = await em.execute<{ saver: string | null }[]>(
      `select distinct case when updated_at >= ? then updated_by_id end as saver from ${table} where ${column}::text in (?)`,
      [since, keys],
    );
    for (const { saver } of rows) savers.add(saver);
  };
  for (const kind of KEPT_KINDS) {
    const keys = changes.flatMap(({ record }) => (record.kind === kind && record.id !== null ? [record.id] : []));
    const [table, column] = KEPT_RECORDS[kind];
    await ask(table, column, keys);
  }
  if (changes.some(({ record }) => record.kind === "flow")) await ask("flow", "id", [flowId]);
  return savers.has(null) ? [] : [...savers].filter((id) => id !== null);
}
