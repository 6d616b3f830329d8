import { Migration } from "@mikro-orm/migrations";

/** Answers that are given again to who sends the same again, and how many requests each caller has made this minute. */
export class ApiAnswers extends Migration {
  override up(): void {
    this.addSql(
      `create table "api_answer" ("id" uuid not null, "person_id" uuid not null, "caller" uuid not null, "key" text not null, "request_hash" text not null, "status" int null, "headers" jsonb not null, "body" text not null, "at" timestamptz not null, constraint "api_answer_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "api_answer_person_id_index" on "api_answer" ("person_id")`);
    this.addSql(`create index "api_answer_at_index" on "api_answer" ("at")`);
    this.addSql(`alter table "api_answer" add constraint "api_answer_caller_key_unique" unique ("caller", "key")`);
    this.addSql(
      `alter table "api_answer" add constraint "api_answer_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade`,
    );
    this.addSql(`alter table "api_answer" enable row level security`);
    this.addSql(
      `create policy own on "api_answer" using (person_id = app_person()) with check (person_id = app_person())`,
    );
    this.addSql(
      `create table "api_rate" ("key" varchar(255) not null, "points" int not null default 0, "expire" bigint null, constraint "api_rate_pkey" primary key ("key"))`,
    );
    // Counts by the id of a caller, and says nothing of anybody's work.
    this.addSql(`alter table "api_rate" enable row level security`);
    this.addSql(`create policy counts on "api_rate" using (true) with check (true)`);
  }

  override down(): void {
    this.addSql(`drop table "api_answer" cascade`);
    this.addSql(`drop table "api_rate" cascade`);
  }
}
