import { Migration } from "@mikro-orm/migrations";

const TABLES = ["recent_visit", "favourite", "saved_filter", "preference"];

/** What a person keeps for themselves: pages opened, records marked, filters of lists, preferences. Nobody else sees or changes it. */
export class FoundQuickly extends Migration {
  override up(): void {
    for (const table of ["recent_visit", "favourite"]) {
      this.addSql(
        `create table "${table}" ("id" uuid not null, "person_id" uuid not null, "kind" text not null, "record_id" uuid not null, "at" timestamptz not null, constraint "${table}_pkey" primary key ("id"))`,
      );
      this.addSql(
        `alter table "${table}" add constraint "${table}_person_id_kind_record_id_unique" unique ("person_id", "kind", "record_id")`,
      );
    }
    this.addSql(
      `create table "saved_filter" ("id" uuid not null, "person_id" uuid not null, "list" text not null, "name" text not null, "query" text not null, "at" timestamptz not null, constraint "saved_filter_pkey" primary key ("id"))`,
    );
    this.addSql(
      `alter table "saved_filter" add constraint "saved_filter_person_id_list_name_unique" unique ("person_id", "list", "name")`,
    );
    this.addSql(
      `create table "preference" ("id" uuid not null, "person_id" uuid not null, "value" jsonb not null, "at" timestamptz not null, constraint "preference_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "preference" add constraint "preference_person_id_unique" unique ("person_id")`);
    for (const table of TABLES) {
      this.addSql(
        `alter table "${table}" add constraint "${table}_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade`,
      );
      this.addSql(`alter table "${table}" enable row level security`);
      this.addSql(
        `create policy own on "${table}" using (person_id = app_person()) with check (person_id = app_person())`,
      );
    }
  }

  override down(): void {
    for (const table of TABLES) this.addSql(`drop table "${table}" cascade`);
  }
}
