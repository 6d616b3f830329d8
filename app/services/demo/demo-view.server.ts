import { createHash } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { PROGRAM_ROLES } from "#app/policies/roles.ts";
import type { DemoCount, DemoHere, DemoNamed, DemoNames, DemoView } from "#app/schemas/demo.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { DEMO_KINDS, type DemoKind } from "./demo-kinds.ts";

/** So many of what people have added, and of what they have changed, are named; the rest is counted. */
const NAMED = 12;

/**
 * Whether the demo is there, and all that would go with it.
 * @throws 403 for a role that may not load and remove it
 */
export async function demoView(scope: ActorScope): Promise<DemoView> {
  requireOnSite(scope, "load and remove the demo");
  return inScope({ ...scope, atTheDemo: true }, (em) => demoAsItIs(em, scope));
}

/** The same within a transaction at the demo's door. */
export async function demoAsItIs(em: EntityManager, { actor }: ActorScope): Promise<DemoView> {
  if (!(await demoIsHere(em))) return { state: "absent" };
  const programs = await demoPrograms(em);
  const owns = (id: string) =>
    actor.memberships.some(({ programId, role }) => programId === id && role === "process owner");
  if (!programs.every(({ id }) => owns(id))) return { state: "not yours" };
  const kept = (await em.execute<{ id: string }[]>("select distinct demo_kept() as id")).map(({ id }) => id);
  const goes: DemoCount[] = [];
  const added: DemoNames = { rows: [], total: 0 };
  const changed: DemoNames = { rows: [], total: 0 };
  for (const kind of DEMO_KINDS) {
    const counted = await countOf(em, kind, kept);
    if (counted.total > 0) goes.push({ kind: counted.total === 1 ? kind.one : kind.many, total: counted.total });
    await nameInto(em, added, counted.added, kind, "d.id is null", kept);
    await nameInto(em, changed, counted.changed, kind, `d.id is not null and ${kind.changed}`, kept);
  }
  const here: Omit<DemoHere, "seen"> = {
    state: "here",
    programs: programs.map(({ name }) => name),
    goes,
    added: newest(added),
    changed: newest(changed),
    kept: await keptNames(em, kept),
    keptStresses: await keptStresses(em, kept),
    jobs: await jobsUnderWay(em),
    stranded: await strandedPeople(em),
  };
  return { ...here, seen: createHash("sha256").update(JSON.stringify(here)).digest("hex") };
}

/** Whether the demo is on the site, whoever belongs to it. */
export async function demoIsHere(em: EntityManager): Promise<boolean> {
  const [there] = await em.execute<unknown[]>("select 1 from demo_record where kind = 'program' limit 1");
  return there !== undefined;
}

/** The programs that came with the demo, by name; away from the demo's door those that the person belongs to. */
export function demoPrograms(em: EntityManager): Promise<{ id: string; name: string }[]> {
  return em.execute(
    "select p.id, p.name from program p join demo_record d on d.id = p.id and d.kind = 'program' order by p.name",
  );
}

const rowsOf = ({ table, goes }: DemoKind) =>
  `from "${table}" x left join demo_record d on d.id = x.id where (${goes})`;
const KEPT = "with kept as (select unnest(?::uuid[]) as id)";
const asArray = (ids: readonly string[]) => `{${ids.join(",")}}`;

async function countOf(em: EntityManager, kind: DemoKind, kept: readonly string[]) {
  const [counted] = await em.execute<{ total: number; added: number; changed: number }[]>(
    `${KEPT} select count(*)::int as total, count(*) filter (where d.id is null)::int as added,
            count(*) filter (where d.id is not null and ${kind.changed})::int as changed ${rowsOf(kind)}`,
    [asArray(kept)],
  );
  return counted ?? { total: 0, added: 0, changed: 0 };
}

async function nameInto(
  em: EntityManager,
  names: DemoNames,
  total: number,
  kind: DemoKind,
  which: string,
  kept: readonly string[],
): Promise<void> {
  if (total === 0) return;
  const rows = await em.execute<{ name: string; by: string | null; at: Date | string }[]>(
    `${KEPT} select ${kind.name} as name, (select w.name from person w where w.id = ${kind.by}) as by, ${kind.at} as at
       ${rowsOf(kind)} and ${which} order by ${kind.at} desc limit ${NAMED}`,
    [asArray(kept)],
  );
  names.total += total;
  names.rows.push(
    ...rows.map(({ at, ...row }): DemoNamed => ({ kind: kind.one, ...row, at: new Date(at).toISOString() })),
  );
}

const newest = ({ rows, total }: DemoNames): DemoNames => ({
  rows: rows.toSorted((one, next) => next.at.localeCompare(one.at)).slice(0, NAMED),
  total,
});

/** Library records that stay, with those that hang on them left out. */
async function keptNames(em: EntityManager, kept: readonly string[]): Promise<DemoHere["kept"]> {
  if (kept.length === 0) return [];
  const tables = DEMO_KINDS.filter(({ table }) =>
    ["film", "carrier", "bonding_material", "tape", "import_profile"].includes(table),
  );
  const sql = tables.map(({ table, one }) => `select '${one}' as kind, name from "${table}" where id = any(?::uuid[])`);
  return em.execute<DemoHere["kept"]>(
    `${sql.join(" union all ")} order by 1, 2`,
    tables.map(() => asArray(kept)),
  );
}

async function keptStresses(em: EntityManager, kept: readonly string[]): Promise<number> {
  const [row] = await em.execute<{ count: number }[]>(
    `${KEPT} select count(*)::int as count from film_stress_value v join scan s on s.id = v.scan_id
      where s.program_id in (select id from demo_record where kind = 'program')
        and v.film_id not in (select id from demo_record where kind = 'film' and id not in (select id from kept))`,
    [asArray(kept)],
  );
  return row?.count ?? 0;
}

async function jobsUnderWay(em: EntityManager): Promise<number> {
  const [row] = await em.execute<{ count: number }[]>(
    `select count(*)::int as count from job where state in ('waiting', 'running')
        and program_id in (select id from demo_record where kind = 'program')`,
  );
  return row?.count ?? 0;
}

/** Who can sign in and belongs to no program but the demo's, each with the strongest role that they hold there. */
async function strandedPeople(em: EntityManager): Promise<DemoHere["stranded"]> {
  const strongest = [...PROGRAM_ROLES].toReversed();
  return em.execute<DemoHere["stranded"]>(
    `select p.id, p.name, (array_agg(m.role order by array_position(?::text[], m.role)))[1] as role
       from membership m join person p on p.id = m.person_id
      where p.active group by p.id, p.name
     having bool_and(m.program_id in (select id from demo_record where kind = 'program')) order by p.name`,
    [`{${strongest.map((role) => `"${role}"`).join(",")}}`],
  );
}
