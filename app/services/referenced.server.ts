import type { EntityManager } from "@mikro-orm/postgresql";

/**
 * The tables that hold on to a row, as the database itself knows them, so that a table added later counts without a line here.
 * @param except 'table.column' that do not count
 */
export async function referencedBy(
  em: EntityManager,
  table: string,
  id: string,
  except: readonly string[] = [],
): Promise<string[]> {
  const columns = await em.execute<{ name: string; column: string }[]>(
    `select c.relname as name, a.attname as "column"
       from pg_constraint k
       join pg_class c on c.oid = k.conrelid
       join pg_attribute a on a.attrelid = k.conrelid and a.attnum = k.conkey[1]
      where k.contype = 'f' and k.confdeltype not in ('n', 'c') and k.confrelid = ?::regclass
      order by 1, 2`,
    [table],
  );
  const holding: string[] = [];
  for (const { name, column } of columns) {
    if (except.includes(`${name}.${column}`) || holding.includes(name)) continue;
    const [found] = await em.execute<unknown[]>(`select 1 from "${name}" where "${column}" = ? limit 1`, [id]);
    if (found) holding.push(name);
  }
  return holding;
}
