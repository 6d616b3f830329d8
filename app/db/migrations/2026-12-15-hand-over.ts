import { Migration } from "@mikro-orm/migrations";

const REFERENCES = { program_id: "program", given_by_id: "person", taken_by_id: "person" } as const;

/**
 * What one shift leaves to the next at a place. The database itself holds that it is given in one's own name, taken over once, by
 * somebody else, and else never changes.
 */
export class HandOvers extends Migration {
  override up(): void {
    this.addSql(
      `create table "hand_over" ("id" uuid not null, "program_id" uuid not null, "given" uuid not null, "place" text not null, "remark" text not null, "lots" jsonb not null, "given_at" timestamptz not null, "given_by_id" uuid not null, "taken_at" timestamptz null, "taken_by_id" uuid null, "taken_remark" text null, constraint "hand_over_pkey" primary key ("id"))`,
    );
    this.addSql(`create unique index "hand_over_given_once" on "hand_over" ("given", "program_id")`);
    this.addSql(`create index "hand_over_program_id_index" on "hand_over" ("program_id")`);
    for (const [column, table] of Object.entries(REFERENCES))
      this.addSql(
        `alter table "hand_over" add constraint "hand_over_${column}_foreign" foreign key ("${column}") references "${table}" ("id") on update cascade${column === "taken_by_id" ? " on delete restrict" : ""}`,
      );
    this.addSql(`
      create function keep_hand_over() returns trigger language plpgsql as $$
        declare moves constant text[] := array['taken_at', 'taken_by_id', 'taken_remark'];
        begin
          if tg_op = 'DELETE' then
            if app_at_the_demo() then return old; end if;
            raise exception 'a hand-over is never deleted' using errcode = 'restrict_violation';
          end if;
          if old.taken_at is not null or to_jsonb(new) - moves is distinct from to_jsonb(old) - moves then
            raise exception 'a hand-over is taken once and else never changes' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger keep_hand_over before update or delete on "hand_over" for each row execute function keep_hand_over()`,
    );
    this.addSql(`alter table "hand_over" enable row level security`);
    const staff = "program_id in (select app_staff_programs())";
    this.addSql(`create policy staff_reads on "hand_over" for select using (${staff})`);
    this.addSql(
      `create policy gives_for_oneself on "hand_over" for insert
         with check (${staff} and given_by_id = app_person() and taken_at is null and taken_by_id is null)`,
    );
    this.addSql(
      `create policy another_takes on "hand_over" for update using (${staff} and given_by_id <> app_person())
         with check (taken_by_id = app_person() and taken_at is not null)`,
    );
  }

  override down(): void {
    this.addSql(`drop table "hand_over" cascade`);
    this.addSql(`drop function keep_hand_over()`);
  }
}
