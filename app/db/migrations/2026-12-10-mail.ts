import { Migration } from "@mikro-orm/migrations";

const OUTBOX = [
  ["program_id", "program"],
  ["person_id", "person"],
  ["created_by_id", "person"],
  ["digest_id", "mail_outbox"],
] as const;

/**
 * Mail to be sent, and what people want of it. A mail is seen by its recipient and by who looks after the outbox of its program; the
 * worker sends through its own door. Whoever announces something may not see what others have chosen, nor their memberships:
 * `mail_readers` tells, of people who are named and of a program that is the caller's own, who is to be told and how.
 */
export class Mail extends Migration {
  override up(): void {
    const definer = "language sql stable security definer set search_path = public, pg_temp";
    this.addSql(
      `create table "mail_outbox" ("id" uuid not null, "program_id" uuid null, "person_id" uuid not null, "kind" text not null, "key" text not null, "announcement" jsonb null, "state" text not null, "message_id" text not null, "attempts" int not null, "attempt_id" uuid null, "lease_until" timestamptz null, "next_try_at" timestamptz not null, "reason" text not null, "digest_id" uuid null, "created_at" timestamptz not null, "created_by_id" uuid null, "sent_at" timestamptz null, constraint "mail_outbox_pkey" primary key ("id"))`,
    );
    for (const column of ["person_id", "digest_id"])
      this.addSql(`create index "mail_outbox_${column}_index" on "mail_outbox" ("${column}")`);
    this.addSql(`create index "mail_outbox_program_id_created_at_index" on "mail_outbox" ("program_id", "created_at")`);
    this.addSql(`create index "mail_outbox_state_next_try_at_index" on "mail_outbox" ("state", "next_try_at")`);
    this.addSql(`alter table "mail_outbox" add constraint "mail_outbox_message_id_unique" unique ("message_id")`);
    this.addSql(
      `alter table "mail_outbox" add constraint "mail_outbox_kind_key_person_id_unique" unique ("kind", "key", "person_id")`,
    );
    for (const [column, table] of OUTBOX)
      this.addSql(
        `alter table "mail_outbox" add constraint "mail_outbox_${column}_foreign" foreign key ("${column}") references "${table}" ("id") on update cascade on delete no action`,
      );
    this.addSql(
      `create table "mail_choice" ("id" uuid not null, "person_id" uuid not null, "value" jsonb not null, "unsubscribe_token" text not null, "at" timestamptz not null, constraint "mail_choice_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "mail_choice" add constraint "mail_choice_person_id_unique" unique ("person_id")`);
    this.addSql(
      `alter table "mail_choice" add constraint "mail_choice_unsubscribe_token_unique" unique ("unsubscribe_token")`,
    );
    this.addSql(
      `alter table "mail_choice" add constraint "mail_choice_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade`,
    );

    this.addSql(`
      create function app_outbox_programs() returns setof uuid ${definer} as $$
        select m.program_id from membership m join person p on p.id = m.person_id
         where p.id = app_person() and (m.role = 'process owner' or p.site_role = 'administrator') $$`);
    this.addSql(`
      create function mail_readers(program uuid, people uuid[])
        returns table (person_id uuid, role text, site_role text, choices jsonb) ${definer} as $$
        select p.id, m.role, p.site_role, coalesce(c.value, '{}'::jsonb)
          from person p
          join membership m on m.person_id = p.id and m.program_id = program
          left join mail_choice c on c.person_id = p.id
         where p.active and p.id = any(people)
           and (app_at_work() or program in (select app_staff_programs())) $$`);

    this.addSql(`
      create function app_process_owners() returns table (program_id uuid, person_id uuid) ${definer} as $$
        select m.program_id, m.person_id from membership m join person p on p.id = m.person_id
         where app_at_work() and p.active and m.role = 'process owner' order by m.created_at, m.id $$`);

    this.addSql(`alter table "mail_outbox" enable row level security`);
    this.addSql(`create policy own on "mail_outbox" for select using (person_id = app_person())`);
    const lookedAfter = `program_id in (select app_outbox_programs()) or (program_id is null and (select app_is_administrator()))`;
    this.addSql(`create policy looked_after on "mail_outbox" for select using (${lookedAfter})`);
    this.addSql(
      `create policy tried_again on "mail_outbox" for update using (${lookedAfter}) with check (${lookedAfter})`,
    );
    this.addSql(
      `create policy announced on "mail_outbox" for insert
         with check (created_by_id = app_person() and program_id in (select app_staff_programs()))`,
    );
    this.addSql(`create policy worker_sends on "mail_outbox" using (app_at_work()) with check (app_at_work())`);

    this.addSql(`alter table "mail_choice" enable row level security`);
    this.addSql(
      `create policy own on "mail_choice" using (person_id = app_person()) with check (person_id = app_person())`,
    );
    this.addSql(`create policy from_a_mail on "mail_choice" for select using (app_at_the_door())`);
    this.addSql(`create policy worker_reads on "mail_choice" for select using (app_at_work())`);
    this.addSql(`create policy worker_begins on "mail_choice" for insert with check (app_at_work())`);
  }

  override down(): void {
    this.addSql(`drop table "mail_choice" cascade`);
    this.addSql(`drop table "mail_outbox" cascade`);
    this.addSql(`drop function mail_readers(uuid, uuid[])`);
    this.addSql(`drop function app_outbox_programs()`);
    this.addSql(`drop function app_process_owners()`);
  }
}
