import { Migration } from "@mikro-orm/migrations";

const REFERENCES = { person_id: "person", program_id: "program", revoked_by_id: "person" } as const;

const definer = "language sql stable security definer set search_path = public";
/** A request with a token is told its program as `app.program`; without one every program of the person counts. */
const narrowed = "(app_token_program() is null or program_id = app_token_program())";

/**
 * Tokens of the API. The wall of a program is narrower for a request with a token: it stands around the token's program alone, and
 * nobody is an administrator through a token. A token is made in one's own name for a program of one's own; afterwards nothing of it
 * moves but its last use and that it was revoked, which cannot be taken back.
 */
export class ApiTokens extends Migration {
  override up(): void {
    this.addSql(
      `create table "api_token" ("id" uuid not null, "person_id" uuid not null, "program_id" uuid not null, "name" text not null, "token_hash" text not null, "beginning" text not null, "scopes" jsonb not null, "created_at" timestamptz not null, "expires_at" timestamptz not null, "last_used_at" timestamptz null, "revoked_at" timestamptz null, "revoked_by_id" uuid null, constraint "api_token_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "api_token" add constraint "api_token_token_hash_unique" unique ("token_hash")`);
    for (const column of ["person_id", "program_id"])
      this.addSql(`create index "api_token_${column}_index" on "api_token" ("${column}")`);
    for (const [column, table] of Object.entries(REFERENCES))
      this.addSql(
        `alter table "api_token" add constraint "api_token_${column}_foreign" foreign key ("${column}") references "${table}" ("id") on update cascade${column === "revoked_by_id" ? " on delete restrict" : ""}`,
      );
    this.addSql(`
      create function keep_api_token() returns trigger language plpgsql as $$
        declare moves constant text[] := array['last_used_at', 'revoked_at', 'revoked_by_id'];
        begin
          if tg_op = 'DELETE' then
            if app_at_the_demo() then return old; end if;
            raise exception 'a token is revoked, not deleted' using errcode = 'restrict_violation';
          end if;
          if old.revoked_at is not null or to_jsonb(new) - moves is distinct from to_jsonb(old) - moves then
            raise exception 'a token is revoked once and else never changes' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger keep_api_token before update or delete on "api_token" for each row execute function keep_api_token()`,
    );
    this.narrowWalls();
    this.addSql(`alter table "api_token" enable row level security`);
    const seen = `person_id = app_person() or app_at_the_door() or (select app_is_administrator())
      or (app_at_the_demo() and program_id in (select app_staff_programs()))`;
    this.addSql(`create policy own_or_administrator on "api_token" for select using (${seen})`);
    this.addSql(
      `create policy makes_for_oneself on "api_token" for insert
         with check (person_id = app_person() and app_token_program() is null and revoked_at is null
           and program_id in (select app_member_programs()) and expires_at <= created_at + interval '366 days')`,
    );
    this.addSql(
      `create policy used_or_revoked on "api_token" for update using (${seen})
         with check (app_at_the_door() or revoked_by_id = app_person())`,
    );
  }

  private narrowWalls(): void {
    this.addSql(`
      create function app_token_program() returns uuid language sql stable as
        $$ select nullif(current_setting('app.program', true), '')::uuid $$`);
    this.addSql(`
      create or replace function app_member_programs() returns setof uuid ${definer} as
        $$ select program_id from membership where person_id = app_person() and ${narrowed} $$`);
    this.addSql(`
      create or replace function app_staff_programs() returns setof uuid ${definer} as
        $$ select program_id from membership where person_id = app_person() and role <> 'guest' and ${narrowed} $$`);
    this.addSql(`
      create or replace function app_is_administrator() returns boolean ${definer} as
        $$ select app_token_program() is null
             and exists (select 1 from person where id = app_person() and site_role = 'administrator') $$`);
  }

  override down(): void {
    this.addSql(`drop table "api_token" cascade`);
    this.addSql(`drop function keep_api_token()`);
    this.addSql(`
      create or replace function app_member_programs() returns setof uuid ${definer} as
        $$ select program_id from membership where person_id = app_person() $$`);
    this.addSql(`
      create or replace function app_staff_programs() returns setof uuid ${definer} as
        $$ select program_id from membership where person_id = app_person() and role <> 'guest' $$`);
    this.addSql(`
      create or replace function app_is_administrator() returns boolean ${definer} as
        $$ select exists (select 1 from person where id = app_person() and site_role = 'administrator') $$`);
    this.addSql(`drop function app_token_program()`);
  }
}
