import { Migration } from "@mikro-orm/migrations";

/** How each instrument writes its files, kept for its next ones. */
export class ImportProfiles extends Migration {
  override up(): void {
    this.addSql(
      `create table "import_profile" ("id" uuid not null, "name" text not null, "profile" jsonb not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "import_profile_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "import_profile" add constraint "import_profile_name_unique" unique ("name")`);
    for (const column of ["created_by_id", "updated_by_id"])
      this.addSql(
        `alter table "import_profile" add constraint "import_profile_${column}_foreign" foreign key ("${column}") references "person" ("id") on update cascade on delete set null`,
      );
    this.addSql(`alter table "import_profile" enable row level security`);
    this.addSql(
      `create policy staff_only on "import_profile" using ((select app_is_staff())) with check ((select app_is_staff()))`,
    );
  }

  override down(): void {
    this.addSql(`drop table "import_profile" cascade`);
  }
}
