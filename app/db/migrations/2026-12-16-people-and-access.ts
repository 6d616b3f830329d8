import { Migration } from "@mikro-orm/migrations";

const ACCOUNT_MAIL = `('invitation', 'password reset', 'address change', 'address changed', 'password changed')`;

/**
 * Invitations, links that set a password or confirm an address, and counts of attempts. At the door a person's row may be changed, but
 * never their site role, and `active` only from an invitation: the trigger holds it, whichever policy let the change through.
 */
export class PeopleAndAccess extends Migration {
  override up(): void {
    this.addSql(
      `alter table "person" add column "invited_at" timestamptz null, add column "last_sign_in_at" timestamptz null`,
    );
    this.addSql(`alter table "session" add column "proven_at" timestamptz not null default now()`);
    this.addSql(`alter table "session" alter column "proven_at" drop default`);
    this.addSql(`alter table "mail_outbox" add column "address" text null`);
    this.addSql(
      `create table "person_token" ("id" uuid not null, "person_id" uuid not null, "purpose" text not null, "address" text not null, "secret_hashes" text[] not null, "created_at" timestamptz not null, "expires_at" timestamptz not null, "ended_at" timestamptz null, constraint "person_token_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "person_token_person_id_index" on "person_token" ("person_id")`);
    this.addSql(
      `alter table "person_token" add constraint "person_token_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `create table "rate_limit" ("key" text not null, "points" int not null, "expire" bigint null, constraint "rate_limit_pkey" primary key ("key"))`,
    );

    this.addSql(`alter table "rate_limit" enable row level security`);
    // Hashes and counts, of nobody's data: every process counts for all.
    this.addSql(`create policy counts on "rate_limit" using (true) with check (true)`);
    this.addSql(`alter table "person_token" enable row level security`);
    for (const [name, allowed] of [
      ["own", "person_id = app_person()"],
      ["at_the_door", "app_at_the_door()"],
      ["administrator", "(select app_is_administrator())"],
      ["worker_writes", "app_at_work()"],
    ])
      this.addSql(`create policy ${name} on "person_token" using (${allowed}) with check (${allowed})`);
    this.addSql(
      `create policy account_mail on "mail_outbox" for insert
         with check (program_id is null and announcement is null and kind in ${ACCOUNT_MAIL}
           and created_by_id is not distinct from app_person()
           and (app_at_the_door() or person_id = app_person() or (select app_is_administrator())))`,
    );

    this.addSql(
      `create policy own_changes on "person" for update using (id = app_person()) with check (id = app_person())`,
    );
    this.addSql(
      `create policy door_changes on "person" for update using (app_at_the_door()) with check (app_at_the_door())`,
    );
    this.addSql(`
      create function keep_person() returns trigger language plpgsql as $$
        begin
          if (app_person() is not null or app_at_the_door()) and not app_is_administrator() then
            if new.site_role is distinct from old.site_role then
              raise exception 'only an administrator changes a role' using errcode = 'insufficient_privilege';
            end if;
            if new.active <> old.active and not (new.active and old.invited_at is not null and app_at_the_door()) then
              raise exception 'only an administrator changes who is active' using errcode = 'insufficient_privilege';
            end if;
          end if;
          return new;
        end $$`);
    this.addSql(`create trigger keep_person before update on "person" for each row execute function keep_person()`);
    this.addSql(`
      create function end_sessions_of(asked uuid) returns void language plpgsql security definer
        set search_path = public, pg_temp as $$
        begin
          if not app_is_administrator() then
            raise exception 'only an administrator ends the sessions of others' using errcode = 'insufficient_privilege';
          end if;
          delete from session where person_id = asked;
        end $$`);
  }

  override down(): void {
    this.addSql(`drop function end_sessions_of(uuid)`);
    this.addSql(`drop trigger keep_person on "person"`);
    this.addSql(`drop function keep_person()`);
    this.addSql(`drop policy door_changes on "person"`);
    this.addSql(`drop policy own_changes on "person"`);
    this.addSql(`drop policy account_mail on "mail_outbox"`);
    this.addSql(`drop table "rate_limit" cascade`);
    this.addSql(`drop table "person_token" cascade`);
    this.addSql(`alter table "mail_outbox" drop column "address"`);
    this.addSql(`alter table "session" drop column "proven_at"`);
    this.addSql(`alter table "person" drop column "invited_at", drop column "last_sign_in_at"`);
  }
}
