import { Migration } from "@mikro-orm/migrations";

const KINDS_BEFORE = ["invitation", "password reset", "address change", "address changed", "password changed"];
const KINDS_OF_CODES = ["codes on", "codes off", "codes reset", "recovery codes made", "recovery code used"];

const accountMail = (kinds: readonly string[]) =>
  `create policy account_mail on "mail_outbox" for insert
     with check (program_id is null and announcement is null and kind in (${kinds.map((kind) => `'${kind}'`).join(", ")})
       and created_by_id is not distinct from app_person()
       and (app_at_the_door() or person_id = app_person() or (select app_is_administrator())))`;

/**
 * One-time codes and the roles that have to sign in with them. A person's own row is theirs; the door takes a code, and an administrator
 * sees that there are codes and takes them away, but never writes any.
 */
export class OneTimeCodes extends Migration {
  override up(): void {
    this.addSql(
      `create table "one_time_codes" ("id" uuid not null, "person_id" uuid not null, "secret_sealed" text not null, "created_at" timestamptz not null, "confirmed_at" timestamptz null, "last_step" int null, "recovery_hashes" text[] not null, "recovery_made_at" timestamptz null, "recovery_used_at" timestamptz null, constraint "one_time_codes_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "one_time_codes" add constraint "one_time_codes_person_id_unique" unique ("person_id")`);
    this.addSql(
      `alter table "one_time_codes" add constraint "one_time_codes_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade`,
    );
    this.addSql(`alter table "one_time_codes" enable row level security`);
    this.addSql(
      `create policy own on "one_time_codes" using (person_id = app_person()) with check (person_id = app_person())`,
    );
    this.addSql(`create policy door_asks on "one_time_codes" for select using (app_at_the_door())`);
    this.addSql(
      `create policy door_takes on "one_time_codes" for update using (app_at_the_door()) with check (app_at_the_door())`,
    );
    this.addSql(
      `create policy administrator_sees on "one_time_codes" for select using ((select app_is_administrator()))`,
    );
    this.addSql(
      `create policy administrator_resets on "one_time_codes" for delete using ((select app_is_administrator()))`,
    );
    this.addSql(`alter table "site_setting" add column "codes_for" text[] not null default '{}'`);
    this.addSql(`alter table "site_setting" alter column "codes_for" drop default`);
    this.addSql(`drop policy account_mail on "mail_outbox"`);
    this.addSql(accountMail([...KINDS_BEFORE, ...KINDS_OF_CODES]));
  }

  override down(): void {
    this.addSql(`drop policy account_mail on "mail_outbox"`);
    this.addSql(accountMail(KINDS_BEFORE));
    this.addSql(`alter table "site_setting" drop column "codes_for"`);
    this.addSql(`drop table "one_time_codes" cascade`);
  }
}
