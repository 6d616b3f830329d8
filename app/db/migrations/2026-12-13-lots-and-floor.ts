import { Migration } from "@mikro-orm/migrations";

const TABLES = ["lot_sheet", "floor_entry", "lot_hold", "step_stop"] as const;
const ADD_ONLY = ["lot_sheet", "floor_entry"] as const;

/** Column, the table that it points to, and what becomes of the row when that is deleted. */
const FOREIGN = [
  ["lot_sheet", "program_id", "program", ""],
  ["lot_sheet", "lot_id", "lot", ""],
  ["lot_sheet", "revision_id", "sheet_revision", ""],
  ["lot_sheet", "created_by_id", "person", ""],
  ["floor_entry", "program_id", "program", ""],
  ["floor_entry", "lot_id", "lot", ""],
  ["floor_entry", "revision_id", "sheet_revision", ""],
  ["floor_entry", "created_by_id", "person", ""],
  ["lot_hold", "program_id", "program", ""],
  ["lot_hold", "lot_id", "lot", ""],
  ["lot_hold", "opened_by_id", "person", ""],
  ["lot_hold", "cleared_by_id", "person", "restrict"],
  ["step_stop", "program_id", "program", ""],
  ["step_stop", "sheet_id", "sheet", ""],
  ["step_stop", "revision_id", "sheet_revision", ""],
  ["step_stop", "lot_id", "lot", ""],
  ["step_stop", "opened_by_id", "person", ""],
  ["step_stop", "cleared_by_id", "person", "restrict"],
] as const;

const INDEXES = [
  ["lot_sheet", ["program_id", "lot_id", "revision_id"]],
  ["floor_entry", ["program_id", "lot_id", "revision_id"]],
  ["lot_hold", ["program_id", "lot_id"]],
  ["step_stop", ["program_id", "sheet_id", "revision_id", "lot_id"]],
] as const;

/**
 * Lots on sheets, and what the floor says of them. The database itself holds what hands rely on: a lot is put on a released revision of
 * its own program only, nothing begins on a revision that is not the lot's or not in force, nor while its lot is held or its step stopped,
 * and a hold or stop is cleared once, with words.
 */
export class LotsAndFloor extends Migration {
  override up(): void {
    this.addTables();
    for (const table of TABLES) {
      this.addSql(`alter table "${table}" enable row level security`);
      this.addSql(
        `create policy program_wall on "${table}" using (program_id in (select app_staff_programs())) with check (program_id in (select app_staff_programs()))`,
      );
    }
    for (const table of ADD_ONLY)
      this.addSql(
        `create trigger never_changes before update or delete on "${table}" for each row execute function refuse_change()`,
      );
    this.addWhatMayBe();
  }

  private addTables(): void {
    this.addSql(`alter table "wafer" add column "status" text not null default 'in line'`);
    this.addSql(
      `create table "lot_sheet" ("id" uuid not null, "program_id" uuid not null, "lot_id" uuid not null, "revision_id" uuid not null, "from_step" int not null, "reason" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "lot_sheet_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "floor_entry" ("id" uuid not null, "program_id" uuid not null, "lot_id" uuid not null, "revision_id" uuid not null, "leg" int not null, "step" int null, "kind" text not null, "content" jsonb not null, "at" timestamptz not null, "received_at" timestamptz not null, "created_by_id" uuid not null, constraint "floor_entry_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "lot_hold" ("id" uuid not null, "program_id" uuid not null, "lot_id" uuid not null, "cause" text not null, "reason" text not null, "opened_at" timestamptz not null, "opened_by_id" uuid not null, "cleared_at" timestamptz null, "cleared_by_id" uuid null, "cleared_words" text null, constraint "lot_hold_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "step_stop" ("id" uuid not null, "program_id" uuid not null, "sheet_id" uuid not null, "revision_id" uuid not null, "lot_id" uuid not null, "step" int not null, "title" text not null, "cause" text not null, "reason" text not null, "opened_at" timestamptz not null, "opened_by_id" uuid not null, "cleared_at" timestamptz null, "cleared_by_id" uuid null, "cleared_words" text null, constraint "step_stop_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create unique index "floor_entry_acknowledged_once" on "floor_entry" ("revision_id", "created_by_id") where kind = 'acknowledged'`,
    );
    for (const [table, columns] of INDEXES)
      for (const column of columns) this.addSql(`create index "${table}_${column}_index" on "${table}" ("${column}")`);
    for (const [table, column, other, deleted] of FOREIGN)
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_foreign" foreign key ("${column}") references "${other}" ("id") on update cascade${deleted && ` on delete ${deleted}`}`,
      );
  }

  private addWhatMayBe(): void {
    this.addSql(`
      create function check_lot_sheet() returns trigger language plpgsql as $$
        begin
          if not exists (select 1 from lot l, sheet_revision r where l.id = new.lot_id and r.id = new.revision_id
                          and l.program_id = new.program_id and r.program_id = new.program_id and r.state = 'released') then
            raise exception 'a lot goes on a released revision of its own program' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger check_lot_sheet before insert on "lot_sheet" for each row execute function check_lot_sheet()`,
    );
    this.addSql(`
      create function check_floor_entry() returns trigger language plpgsql as $$
        begin
          if not exists (select 1 from lot_sheet s where s.lot_id = new.lot_id and s.revision_id = new.revision_id
                          and s.program_id = new.program_id) then
            raise exception 'an entry is of a revision that its lot is or was on' using errcode = 'restrict_violation';
          end if;
          if new.kind <> 'started' then return new; end if;
          if new.revision_id is distinct from
             (select s.revision_id from lot_sheet s where s.lot_id = new.lot_id order by s.created_at desc, s.id desc limit 1)
             or not exists (select 1 from sheet_revision r where r.id = new.revision_id and r.state = 'released') then
            raise exception 'a step begins only by the released revision that its lot is on' using errcode = 'restrict_violation';
          end if;
          if exists (select 1 from lot_hold h where h.lot_id = new.lot_id and h.cleared_at is null) then
            raise exception 'the lot is held' using errcode = 'restrict_violation';
          end if;
          if exists (select 1 from step_stop s where s.revision_id = new.revision_id and s.step = new.step and s.cleared_at is null) then
            raise exception 'the step is stopped' using errcode = 'restrict_violation';
          end if;
          if not exists (select 1 from floor_entry e where e.revision_id = new.revision_id and e.created_by_id = new.created_by_id
                          and e.kind = 'acknowledged') then
            raise exception 'nobody begins a step of a sheet that they have not acknowledged' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger check_floor_entry before insert on "floor_entry" for each row execute function check_floor_entry()`,
    );
    this.addSql(`
      create function keep_block() returns trigger language plpgsql as $$
        declare moves constant text[] := array['cleared_at', 'cleared_by_id', 'cleared_words'];
        begin
          if tg_op = 'DELETE' then
            if app_at_the_demo() then return old; end if;
            raise exception 'a hold or stop is never deleted' using errcode = 'restrict_violation';
          end if;
          if old.cleared_at is not null or to_jsonb(new) - moves is distinct from to_jsonb(old) - moves then
            raise exception 'a hold or stop is cleared once and else never changes' using errcode = 'restrict_violation';
          end if;
          if new.cleared_at is null or new.cleared_by_id is null or coalesce(trim(new.cleared_words), '') = '' then
            raise exception 'a hold or stop is cleared by somebody, with words' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    for (const table of ["lot_hold", "step_stop"])
      this.addSql(
        `create trigger keep_block before update or delete on "${table}" for each row execute function keep_block()`,
      );
  }

  override down(): void {
    for (const table of TABLES.toReversed()) this.addSql(`drop table "${table}" cascade`);
    for (const name of ["keep_block", "check_floor_entry", "check_lot_sheet"]) this.addSql(`drop function ${name}()`);
    this.addSql(`alter table "wafer" drop column "status"`);
  }
}
