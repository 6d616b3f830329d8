import { Migration } from "@mikro-orm/migrations";

/** Tables that hold a program's data, with the column that names the program. */
const PROGRAM_TABLES = [
  "stack",
  "stack_layer",
  "flow",
  "flow_step",
  "flow_step_film",
  "assessment",
  "scan_file",
  "scan",
];

/** Tables that the site shares and that guests never see. */
const SITE_TABLES = ["film", "silicon", "carrier", "bonding_material", "equipment", "site_limit"];

const OTHER_TABLES = ["person", "credential", "session", "program", "membership", "audit_event"];

/**
 * The second wall, below the services: a query that forgets its scope returns nothing. Who asks is told to each transaction as
 * `app.person`; `app.door` is 'sign-in' for the few queries that come before anybody is known. The functions run as the owner of
 * the tables, for whom no policy applies, so they can read memberships without asking themselves.
 */
export class RowLevelSecurity extends Migration {
  override up(): void {
    const definer = "language sql stable security definer set search_path = public";
    this.addSql(`
      create function app_person() returns uuid language sql stable as
        $$ select nullif(current_setting('app.person', true), '')::uuid $$`);
    this.addSql(`
      create function app_at_the_door() returns boolean language sql stable as
        $$ select coalesce(current_setting('app.door', true), '') = 'sign-in' $$`);
    this.addSql(`
      create function app_member_programs() returns setof uuid ${definer} as
        $$ select program_id from membership where person_id = app_person() $$`);
    this.addSql(`
      create function app_staff_programs() returns setof uuid ${definer} as
        $$ select program_id from membership where person_id = app_person() and role <> 'guest' $$`);
    this.addSql(`
      create function app_is_administrator() returns boolean ${definer} as
        $$ select exists (select 1 from person where id = app_person() and site_role = 'administrator') $$`);
    this.addSql(`
      create function app_is_staff() returns boolean ${definer} as $$
        select exists (select 1 from membership where person_id = app_person() and role <> 'guest')
            or exists (select 1 from person where id = app_person() and site_role is not null) $$`);

    for (const table of [...PROGRAM_TABLES, ...SITE_TABLES, ...OTHER_TABLES])
      this.addSql(`alter table "${table}" enable row level security`);
    for (const table of PROGRAM_TABLES)
      this.addSql(
        `create policy program_wall on "${table}" using (program_id in (select app_staff_programs()))
           with check (program_id in (select app_staff_programs()))`,
      );
    for (const table of SITE_TABLES)
      this.addSql(
        `create policy staff_only on "${table}" using ((select app_is_staff())) with check ((select app_is_staff()))`,
      );

    this.addSql(`create policy own_programs on "program" for select using (id in (select app_member_programs()))`);
    this.addSql(`create policy administrator on "program" using ((select app_is_administrator()))`);
    this.addSql(
      `create policy own_memberships on "membership" for select using (person_id = app_person() or app_at_the_door())`,
    );
    this.addSql(`create policy administrator on "membership" using ((select app_is_administrator()))`);
    this.addSql(
      `create policy colleagues on "person" for select
         using (id = app_person() or app_at_the_door() or (select app_is_staff()))`,
    );
    this.addSql(`create policy administrator on "person" using ((select app_is_administrator()))`);
    this.addSql(`create policy own on "credential" using (person_id = app_person() or app_at_the_door())`);
    this.addSql(`create policy own on "session" using (person_id = app_person() or app_at_the_door())`);
    this.addSql(
      `create policy trail_grows on "audit_event" for insert
         with check (actor_id is not distinct from app_person() or app_at_the_door())`,
    );
    this.addSql(
      `create policy administrator_reads on "audit_event" for select using ((select app_is_administrator()))`,
    );

    // What was assessed, uploaded or recorded stays as it was, whoever asks and whatever was granted.
    this.addSql(`
      create function refuse_change() returns trigger language plpgsql as $$
        begin raise exception 'rows of % are never changed or deleted', tg_table_name using errcode = 'restrict_violation'; end $$`);
    for (const table of ["assessment", "scan_file", "audit_event"])
      this.addSql(
        `create trigger never_changes before update or delete on "${table}" for each row execute function refuse_change()`,
      );
  }

  override down(): void {
    for (const table of ["assessment", "scan_file", "audit_event"])
      this.addSql(`drop trigger never_changes on "${table}"`);
    this.addSql(`drop function refuse_change()`);
    for (const table of PROGRAM_TABLES) this.addSql(`drop policy program_wall on "${table}"`);
    for (const table of SITE_TABLES) this.addSql(`drop policy staff_only on "${table}"`);
    for (const [policy, table] of [
      ["own_programs", "program"],
      ["administrator", "program"],
      ["own_memberships", "membership"],
      ["administrator", "membership"],
      ["colleagues", "person"],
      ["administrator", "person"],
      ["own", "credential"],
      ["own", "session"],
      ["trail_grows", "audit_event"],
      ["administrator_reads", "audit_event"],
    ])
      this.addSql(`drop policy ${policy} on "${table}"`);
    for (const table of [...PROGRAM_TABLES, ...SITE_TABLES, ...OTHER_TABLES])
      this.addSql(`alter table "${table}" disable row level security`);
    for (const name of [
      "app_is_staff",
      "app_is_administrator",
      "app_staff_programs",
      "app_member_programs",
      "app_at_the_door",
      "app_person",
    ])
      this.addSql(`drop function ${name}()`);
  }
}
