import { Migration } from "@mikro-orm/migrations";

/** What holds for the whole site: one row, which everybody signed in reads, guests print as well, and administrators change. */
export class SiteSetting extends Migration {
  override up(): void {
    this.addSql(
      `create table "site_setting" ("id" uuid not null, "paper" text not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "site_setting_pkey" primary key ("id"))`,
    );
    for (const column of ["created_by_id", "updated_by_id"])
      this.addSql(
        `alter table "site_setting" add constraint "site_setting_${column}_foreign" foreign key ("${column}") references "person" ("id") on update cascade on delete set null`,
      );
    this.addSql(
      `insert into "site_setting" ("id", "paper", "created_at", "updated_at") values (gen_random_uuid(), 'a4', now(), now())`,
    );
    this.addSql(`alter table "site_setting" enable row level security`);
    this.addSql(`create policy everybody_reads on "site_setting" for select using (app_person() is not null)`);
    this.addSql(
      `create policy administrator_changes on "site_setting" for update
         using ((select app_is_administrator())) with check ((select app_is_administrator()))`,
    );
  }

  override down(): void {
    this.addSql(`drop table "site_setting" cascade`);
  }
}
