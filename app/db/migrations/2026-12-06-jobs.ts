import { Migration } from "@mikro-orm/migrations";

const FOREIGN = [
  ["job", "program_id", "program"],
  ["job", "created_by_id", "person"],
  ["scan_reading", "program_id", "program"],
  ["scan_reading", "file_id", "scan_file"],
  ["scan_reading", "created_by_id", "person"],
] as const;

/**
 * Jobs as people see them, and what files say when they are read. Whoever works a job off tells its state through a door of their
 * own (`app.door` is 'worker'), because the person who asked may have left the program since; the work itself is done as that person.
 */
export class Jobs extends Migration {
  override up(): void {
    this.addSql(
      `create table "job" ("id" uuid not null, "program_id" uuid not null, "kind" text not null, "title" text not null, "state" text not null, "done" double precision not null, "total" double precision not null, "unit" text not null, "sentence" text not null, "input" jsonb not null, "outcome" jsonb null, "stop_asked" boolean not null, "created_at" timestamptz not null, "created_by_id" uuid not null, "started_at" timestamptz null, "ended_at" timestamptz null, constraint "job_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "job_program_id_created_at_index" on "job" ("program_id", "created_at")`);
    this.addSql(
      `create table "scan_reading" ("id" uuid not null, "program_id" uuid not null, "file_id" uuid not null, "settings" jsonb not null, "settings_hash" text not null, "result" jsonb not null, "engine_version" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "scan_reading_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "scan_reading_program_id_index" on "scan_reading" ("program_id")`);
    this.addSql(
      `alter table "scan_reading" add constraint "scan_reading_file_id_settings_hash_unique" unique ("file_id", "settings_hash")`,
    );
    for (const [table, column, other] of FOREIGN)
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_foreign" foreign key ("${column}") references "${other}" ("id") on update cascade`,
      );
    // Not compressed, so that a piece of a large file is read without all that stands before it.
    this.addSql(`alter table "scan_file" alter column "bytes" set storage external`);
    for (const table of ["job", "scan_reading"]) {
      this.addSql(`alter table "${table}" enable row level security`);
      this.addSql(
        `create policy program_wall on "${table}" using (program_id in (select app_staff_programs())) with check (program_id in (select app_staff_programs()))`,
      );
    }
    this.addSql(`
      create function app_at_work() returns boolean language sql stable as
        $$ select coalesce(current_setting('app.door', true), '') = 'worker' $$`);
    this.addSql(`create policy worker_reads on "job" for select using (app_at_work())`);
    this.addSql(`create policy worker_notes on "job" for update using (app_at_work()) with check (app_at_work())`);
  }

  override down(): void {
    this.addSql(`alter table "scan_file" alter column "bytes" set storage extended`);
    this.addSql(`drop table "job" cascade`);
    this.addSql(`drop table "scan_reading" cascade`);
    this.addSql(`drop function app_at_work()`);
  }
}
