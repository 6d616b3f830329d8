import { Migration } from "@mikro-orm/migrations";

/** Table, column, what it names, and what becomes of the row when that is deleted. A scan that a film's history rests on is kept. */
const FOREIGN = [
  ["film_stress_value", "film_id", "film", ""],
  ["film_stress_value", "scan_id", "scan", " on delete restrict"],
  ["film_stress_value", "accepted_by_id", "person", ""],
  ["film_stress_value", "set_aside_by_id", "person", " on delete set null"],
  ["film_stress_value", "put_back_by_id", "person", " on delete set null"],
  ["film_stress_in_use", "film_id", "film", ""],
  ["film_stress_in_use", "by_id", "person", " on delete set null"],
] as const;

/**
 * Measured stresses that were taken into a film's history, and every stress that a film had in use. The second writes itself: a
 * trigger adds a row when a film's stress is saved, whatever saves it.
 */
export class FilmStress extends Migration {
  override up(): void {
    this.addSql(
      `create table "film_stress_value" ("id" uuid not null, "film_id" uuid not null, "scan_id" uuid null, "value" double precision not null, "standard_uncertainty" double precision not null, "common_uncertainty" double precision not null, "film_thickness" double precision null, "instrument" text not null, "measured_at" timestamptz not null, "state" text not null, "reason" text not null, "source" text not null, "accepted_at" timestamptz not null, "accepted_by_id" uuid not null, "set_aside_reason" text null, "set_aside_at" timestamptz null, "set_aside_by_id" uuid null, "put_back_at" timestamptz null, "put_back_by_id" uuid null, "version" int not null default 1, constraint "film_stress_value_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "film_stress_value_film_id_index" on "film_stress_value" ("film_id")`);
    this.addSql(`alter table "film_stress_value" add constraint "film_stress_value_scan_id_unique" unique ("scan_id")`);
    this.addSql(
      `create table "film_stress_in_use" ("id" uuid not null, "film_id" uuid not null, "stress" jsonb not null, "since" timestamptz not null, "by_id" uuid null, constraint "film_stress_in_use_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "film_stress_in_use_film_id_since_index" on "film_stress_in_use" ("film_id", "since")`);
    for (const [table, column, other, deleted] of FOREIGN)
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_foreign" foreign key ("${column}") references "${other}" ("id") on update cascade${deleted}`,
      );
    for (const table of ["film_stress_value", "film_stress_in_use"]) {
      this.addSql(`alter table "${table}" enable row level security`);
      this.addSql(
        `create policy staff_only on "${table}" using ((select app_is_staff())) with check ((select app_is_staff()))`,
      );
    }
    this.addSql(
      `insert into "film_stress_in_use" (id, film_id, stress, since, by_id)
         select gen_random_uuid(), id, stress, updated_at, updated_by_id from film`,
    );
    this.addSql(`
      create function note_film_stress() returns trigger language plpgsql as $$
        begin
          insert into film_stress_in_use (id, film_id, stress, since, by_id)
            values (gen_random_uuid(), new.id, new.stress, new.updated_at, new.updated_by_id);
          return null;
        end $$`);
    this.addSql(
      `create trigger stress_in_use_begins after insert on "film" for each row execute function note_film_stress()`,
    );
    this.addSql(
      `create trigger stress_in_use_changes after update on "film" for each row
         when ((old.stress - 'text') is distinct from (new.stress - 'text')) execute function note_film_stress()`,
    );
    this.addSql(
      `create trigger never_changes before update or delete on "film_stress_in_use" for each row execute function refuse_change()`,
    );
  }

  override down(): void {
    this.addSql(`drop trigger stress_in_use_begins on "film"`);
    this.addSql(`drop trigger stress_in_use_changes on "film"`);
    this.addSql(`drop function note_film_stress()`);
    this.addSql(`drop table "film_stress_in_use" cascade`);
    this.addSql(`drop table "film_stress_value" cascade`);
  }
}
