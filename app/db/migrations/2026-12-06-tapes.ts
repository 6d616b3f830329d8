import { Migration } from "@mikro-orm/migrations";

const STAMP = ["created_by_id", "updated_by_id"];

/** Tapes are records of the library, which a step may choose. What stands on steps already stays there. */
export class Tapes extends Migration {
  override up(): void {
    this.addSql(
      `create table "tape" ("id" uuid not null, "name" text not null, "kind" text not null, "note" text not null, "thickness" jsonb null, "temperature_limit" jsonb null, "embedding_depth" jsonb null, "thickness_variation" jsonb null, "longest_time" jsonb null, "handling" jsonb not null, "handling_source" text not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "tape_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "tape" add constraint "tape_name_unique" unique ("name")`);
    for (const column of STAMP)
      this.addSql(
        `alter table "tape" add constraint "tape_${column}_foreign" foreign key ("${column}") references "person" ("id") on update cascade on delete set null`,
      );
    this.addSql(`alter table "tape" enable row level security`);
    this.addSql(
      `create policy staff_only on "tape" using ((select app_is_staff())) with check ((select app_is_staff()))`,
    );
    this.addSql(`alter table "flow_step" add column "tape_id" uuid null`);
    this.addSql(
      `alter table "flow_step" add constraint "flow_step_tape_id_foreign" foreign key ("tape_id") references "tape" ("id") on update cascade on delete set null`,
    );
  }

  override down(): void {
    this.addSql(`alter table "flow_step" drop column "tape_id"`);
    this.addSql(`drop table "tape"`);
  }
}
