import { Migration } from "@mikro-orm/migrations";

/** Words of the audit trail for the kinds of record that the demo is told by, where they are not their table's name. */
const KIND = `case subject when 'carrier piece' then 'carrier_unit' else replace(subject, ' ', '_') end`;
const KINDS = `('program', 'person', 'stack', 'flow', 'assessment', 'scan_file', 'scan', 'lot', 'wafer', 'wafer_measurement', 'film', 'carrier',
  'carrier_unit', 'bonding_material', 'tape', 'import_profile', 'repeatability_study', 'reference_wafer', 'reference_reading')`;

const DEMO_PROGRAMS = `select d.id from demo_record d where d.kind = 'program'`;
const definer = "security definer set search_path = public, pg_temp";

/** Records of the library that are chosen by id within JSON, where no foreign key holds on to them. */
const IN_JSON = [
  ["step_template", "step", "true"],
  ["flow_template", "steps", "true"],
  ["flow_revision", "plan", `x.program_id not in (${DEMO_PROGRAMS})`],
  ["wafer_scan", "subject", `x.program_id not in (${DEMO_PROGRAMS})`],
] as const;

/**
 * What came with the demo is written down, so that it can be taken out again and nothing else with it. Assessments and raw files are
 * only ever added, and the plain role has no right to delete them: `remove_demo` runs as the owner of the tables, takes no argument,
 * deletes of programs of the demo alone, and asks by itself who calls it. `demo_kept` looks into every program, because a film of the
 * demo may stand in a stack that its reader may not know of: it tells only that it is used.
 */
export class DemoComesAndGoes extends Migration {
  override up(): void {
    this.addSql(
      `create table "demo_record" ("id" uuid not null, "kind" text not null, "at" timestamptz not null, constraint "demo_record_pkey" primary key ("id"))`,
    );
    this.addSql(
      `insert into demo_record (id, kind, at) select subject_id, ${KIND}, min(at) from audit_event
         where request_id = 'demo data' and action = 'created' and subject_id is not null and ${KIND} in ${KINDS}
         group by 1, 2`,
    );
    this.addSql(`
      create function app_at_the_demo() returns boolean language sql stable as
        $$ select coalesce(current_setting('app.door', true), '') = 'demo' $$`);
    this.addSql(`alter table "demo_record" enable row level security`);
    this.addSql(`create policy staff_reads on "demo_record" for select using ((select app_is_staff()))`);
    for (const table of ["demo_record", "program", "membership", "person"])
      this.addSql(
        `create policy demo_comes on "${table}" for insert with check (app_at_the_demo() and (select app_is_staff()))`,
      );
    this.addSql(
      `create policy demo_counts on "membership" for select using (app_at_the_demo() and (select app_is_staff()))`,
    );
    this.addSql(
      `create policy demo_names on "program" for select using (app_at_the_demo() and (select app_is_staff()))`,
    );
    this.addKept();
    this.addRemoval();
    // Rows that are never changed go with the demo, and only by the function that takes it out: the plain role may not delete them.
    this.addSql(`
      create or replace function refuse_change() returns trigger language plpgsql as $$
        begin
          if tg_op = 'DELETE' and tg_table_name <> 'audit_event' and app_at_the_demo() then return old; end if;
          raise exception 'rows of % are never changed or deleted', tg_table_name using errcode = 'restrict_violation';
        end $$`);
  }

  /** Records of the demo's library that something outside its programs holds on to. */
  private addKept(): void {
    const kinds = `('film', 'carrier', 'bonding_material', 'tape', 'import_profile')`;
    const inJson = IN_JSON.map(
      ([table, column, outside]) =>
        `or exists (select 1 from "${table}" x where ${outside} and x."${column}"::text like '%' || r.id || '%')`,
    ).join("\n               ");
    this.addSql(`
      create function demo_kept() returns setof uuid language plpgsql stable ${definer} as $$
        declare held record;
        begin
          if not (app_at_the_demo() and app_is_staff()) then
            raise exception 'only where the demo is taken out' using errcode = 'insufficient_privilege';
          end if;
          for held in
            select c.relname as by_table, a.attname as by_column, t.relname as kind
              from pg_constraint k
              join pg_class c on c.oid = k.conrelid
              join pg_class t on t.oid = k.confrelid
              join pg_attribute a on a.attrelid = k.conrelid and a.attnum = k.conkey[1]
             where k.contype = 'f' and t.relname in ${kinds}
               and exists (select 1 from pg_attribute w where w.attrelid = c.oid and w.attname = 'program_id')
          loop
            return query execute format(
              'select r.id from demo_record r where r.kind = %L and exists
                 (select 1 from %I x where x.%I = r.id and x.program_id not in (${DEMO_PROGRAMS.replaceAll("'", "''")}))',
              held.kind, held.by_table, held.by_column);
          end loop;
          return query
            select r.id from demo_record r
             where r.kind in ${kinds} and (
               exists (select 1 from film_stress_value v join scan s on s.id = v.scan_id
                        where v.film_id = r.id and s.program_id not in (${DEMO_PROGRAMS}))
               ${inJson});
        end $$`);
  }

  /** Tables with a program's rows are found in the catalogue and emptied in the order of their foreign keys, so a new one counts at once. */
  private addRemoval(): void {
    this.addSql(`
      create function remove_demo() returns void language plpgsql ${definer} as $$
        declare
          programs uuid[];
          kept uuid[];
          films uuid[];
          carriers uuid[];
          instruments uuid[];
          todo text[];
          next_table text;
          someone uuid;
        begin
          if not (app_at_the_demo() and app_is_staff()) then
            raise exception 'only where the demo is taken out' using errcode = 'insufficient_privilege';
          end if;
          -- Waits for whoever is writing into these programs, and lets nobody begin.
          select array_agg(p.id) into programs
            from (select id from program where id in (${DEMO_PROGRAMS}) order by id for update) p;
          if programs is null then
            raise exception 'the demo is not there' using errcode = 'no_data_found';
          end if;
          if exists (select 1 from unnest(programs) demo(id) where not exists (
               select 1 from membership m
                where m.program_id = demo.id and m.person_id = app_person() and m.role = 'process owner')) then
            raise exception 'only a process owner of every program of the demo' using errcode = 'insufficient_privilege';
          end if;
          if exists (select 1 from job where program_id = any(programs) and state in ('waiting', 'running')) then
            raise exception 'work of the demo is under way' using errcode = 'object_in_use';
          end if;

          kept := array(select demo_kept());
          films := array(select id from demo_record where kind = 'film' and id <> all(kept));
          carriers := array(select id from demo_record where kind = 'carrier' and id <> all(kept));
          instruments := array(select id from demo_record where kind = 'import_profile' and id <> all(kept));

          -- What was measured of a film that stays keeps its figures, without the scan that goes.
          delete from film_stress_value where film_id = any(films);
          update film_stress_value set scan_id = null
           where scan_id in (select id from scan where program_id = any(programs));

          todo := array(
            select c.relname::text from pg_constraint k
              join pg_class c on c.oid = k.conrelid
              join pg_attribute a on a.attrelid = k.conrelid and a.attnum = k.conkey[1]
             where k.contype = 'f' and k.confrelid = 'program'::regclass and a.attname = 'program_id');
          while cardinality(todo) > 0 loop
            select t into next_table from unnest(todo) t
             where not exists (
               select 1 from pg_constraint k join pg_class c on c.oid = k.conrelid
                where k.contype = 'f' and k.confrelid = format('%I', t)::regclass
                  and c.relname <> t and c.relname = any(todo))
             limit 1;
            execute format('delete from %I where program_id = any($1)', next_table) using programs;
            todo := array_remove(todo, next_table);
          end loop;
          delete from program where id = any(programs);

          delete from film_stress_in_use where film_id = any(films);
          delete from film where id = any(films);
          delete from carrier_unit where carrier_id = any(carriers);
          delete from carrier where id = any(carriers);
          delete from bonding_material b using demo_record d
           where d.id = b.id and d.kind = 'bonding_material' and b.id <> all(kept);
          delete from tape t using demo_record d where d.id = t.id and d.kind = 'tape' and t.id <> all(kept);
          delete from repeatability_study where profile_id = any(instruments);
          delete from reference_reading where profile_id = any(instruments);
          delete from import_profile where id = any(instruments);
          delete from reference_wafer w using demo_record d
           where d.id = w.id and not exists (select 1 from reference_reading r where r.wafer_id = w.id);

          -- Names without a sign-in, if nothing that stays was theirs.
          for someone in
            select p.id from person p join demo_record d on d.id = p.id
             where not p.active and not exists (select 1 from credential c where c.person_id = p.id)
          loop
            begin
              delete from person where id = someone;
            exception when foreign_key_violation then null;
            end;
          end loop;
          delete from demo_record;
        end $$`);
  }

  override down(): void {
    this.addSql(`
      create or replace function refuse_change() returns trigger language plpgsql as $$
        begin raise exception 'rows of % are never changed or deleted', tg_table_name using errcode = 'restrict_violation'; end $$`);
    this.addSql(`drop function remove_demo()`);
    this.addSql(`drop function demo_kept()`);
    this.addSql(`drop policy demo_names on "program"`);
    this.addSql(`drop policy demo_counts on "membership"`);
    for (const table of ["program", "membership", "person"]) this.addSql(`drop policy demo_comes on "${table}"`);
    this.addSql(`drop table "demo_record" cascade`);
    this.addSql(`drop function app_at_the_demo()`);
  }
}
