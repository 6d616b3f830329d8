import { Migration } from "@mikro-orm/migrations";

/** What is known of the site's instruments: how well they repeat, and what they read on wafers of known bow. */
export class Instruments extends Migration {
  override up(): void {
    this.addSql(
      `create table "repeatability_study" ("id" uuid not null, "profile_id" uuid null, "instrument" text not null, "wafer" text not null, "diameter" double precision not null, "readings" jsonb not null, "result" jsonb not null, "note" text not null, "set_aside" text null, "engine_version" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "repeatability_study_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "reference_wafer" ("id" uuid not null, "name" text not null, "bow" double precision not null, "bow_uncertainty" double precision not null, "diameter" double precision not null, "note" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "reference_wafer_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "reference_wafer" add constraint "reference_wafer_name_unique" unique ("name")`);
    this.addSql(
      `create table "reference_reading" ("id" uuid not null, "profile_id" uuid null, "instrument" text not null, "wafer_id" uuid not null, "measured_on" date not null, "bow" double precision not null, "note" text not null, "set_aside" text null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "reference_reading_pkey" primary key ("id"))`,
    );
    for (const table of ["repeatability_study", "reference_reading"]) {
      this.addSql(`create index "${table}_profile_id_index" on "${table}" ("profile_id")`);
      this.addSql(
        `alter table "${table}" add constraint "${table}_profile_id_foreign" foreign key ("profile_id") references "import_profile" ("id") on update cascade on delete set null`,
      );
    }
    this.addSql(
      `alter table "reference_reading" add constraint "reference_reading_wafer_id_foreign" foreign key ("wafer_id") references "reference_wafer" ("id") on update cascade`,
    );
    for (const table of ["repeatability_study", "reference_wafer", "reference_reading"]) {
      this.addSql(
        `alter table "${table}" add constraint "${table}_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade`,
      );
      this.addSql(`alter table "${table}" enable row level security`);
      this.addSql(
        `create policy staff_only on "${table}" using ((select app_is_staff())) with check ((select app_is_staff()))`,
      );
    }
  }

  override down(): void {
    for (const table of ["reference_reading", "reference_wafer", "repeatability_study"])
      this.addSql(`drop table "${table}" cascade`);
  }
}
