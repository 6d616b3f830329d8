import { Migration } from "@mikro-orm/migrations";

const definer = "language sql stable security definer set search_path = public, pg_temp";
const MOVES = {
  webhook: ["sealed_secret", "secret_made_at", "state", "off_reason", "failures", "failing_since", "last_sent_at"],
  webhook_delivery: ["state", "attempts", "tries", "attempt_id", "lease_until", "next_try_at", "reason", "sent_at"],
} as const;

/**
 * Webhooks and what they are told. A webhook is seen by who made it and who looks after those of its program; its deliveries by whoever
 * sees it. Whoever does something may not see which webhooks hear of it: `webhook_listeners` tells, of a program of the caller's own. A
 * delivery is of the webhook's program, whoever writes it.
 */
export class Webhooks extends Migration {
  override up(): void {
    this.addSql(
      `create table "webhook" ("id" uuid not null, "program_id" uuid not null, "name" text not null, "address" text not null, "events" jsonb not null, "sealed_secret" text not null, "secret_made_at" timestamptz not null, "state" text not null, "off_reason" text not null, "failures" int not null, "failing_since" timestamptz null, "last_sent_at" timestamptz null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "webhook_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "webhook_delivery" ("id" uuid not null, "program_id" uuid not null, "webhook_id" uuid not null, "event" text not null, "key" text not null, "event_id" uuid not null, "about" text not null, "body" text not null, "state" text not null, "attempts" int not null, "tries" jsonb not null, "attempt_id" uuid null, "lease_until" timestamptz null, "next_try_at" timestamptz not null, "reason" text not null, "created_at" timestamptz not null, "created_by_id" uuid null, "by_hand" boolean not null, "sent_at" timestamptz null, constraint "webhook_delivery_pkey" primary key ("id"))`,
    );
    this.addKeys();
    this.addKeepers();
    this.addSql(`
      create function webhook_listeners(program uuid, event text)
        returns table (webhook_id uuid, person_id uuid, role text, site_role text) ${definer} as $$
        select w.id, p.id, m.role, p.site_role
          from webhook w
          join person p on p.id = w.created_by_id and p.active
          join membership m on m.person_id = p.id and m.program_id = w.program_id
         where w.program_id = program and w.state = 'on' and w.events @> to_jsonb(event)
           and (app_at_work() or program in (select app_staff_programs())) $$`);
    this.addSql(`alter table "webhook" enable row level security`);
    this.addSql(`alter table "webhook_delivery" enable row level security`);
    const own = `(created_by_id = app_person() and program_id in (select app_member_programs()))`;
    const seen = `app_token_program() is null and (${own} or program_id in (select app_outbox_programs()))`;
    const atTheDemo = `app_at_the_demo() and program_id in (select app_staff_programs())`;
    this.addSql(
      `create policy made_or_looked_after on "webhook" for select using ((${seen}) or app_at_work() or (${atTheDemo}))`,
    );
    this.addSql(
      `create policy made_in_ones_own_name on "webhook" for insert with check (app_token_program() is null and ${own})`,
    );
    this.addSql(
      `create policy changed on "webhook" for update using ((${seen}) or app_at_work()) with check ((${seen}) or app_at_work())`,
    );
    this.addSql(`create policy removed on "webhook" for delete using (${seen})`);
    this.addSql(
      `create policy with_its_webhook on "webhook_delivery" for select
         using (app_at_work() or exists (select from webhook w where w.id = webhook_id))`,
    );
    this.addSql(`create policy told on "webhook_delivery" for insert with check (app_at_work() or ${own})`);
    this.addSql(
      `create policy worker_sends on "webhook_delivery" for update using (app_at_work()) with check (app_at_work())`,
    );
    this.addSql(`create policy worker_forgets on "webhook_delivery" for delete using (app_at_work())`);
  }

  private addKeys(): void {
    const indexes = [
      ["webhook", "program_id"],
      ["webhook", "created_by_id"],
      ["webhook_delivery", "program_id"],
      ["webhook_delivery", "webhook_id", "created_at"],
      ["webhook_delivery", "state", "next_try_at"],
    ] as const;
    for (const [table, ...columns] of indexes)
      this.addSql(
        `create index "${table}_${columns.join("_")}_index" on "${table}" (${columns.map((name) => `"${name}"`).join(", ")})`,
      );
    this.addSql(
      `alter table "webhook_delivery" add constraint "webhook_delivery_webhook_id_event_key_unique" unique ("webhook_id", "event", "key")`,
    );
    const foreign = [
      ["webhook", "program_id", "program", ""],
      ["webhook", "created_by_id", "person", ""],
      ["webhook_delivery", "program_id", "program", ""],
      ["webhook_delivery", "webhook_id", "webhook", " on delete cascade"],
      ["webhook_delivery", "created_by_id", "person", " on delete no action"],
    ] as const;
    for (const [table, column, other, rule] of foreign)
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_foreign" foreign key ("${column}") references "${other}" ("id") on update cascade${rule}`,
      );
  }

  /** What is written stays as it is, and a delivery never leaves its webhook's program. */
  private addKeepers(): void {
    for (const [table, moves] of Object.entries(MOVES)) {
      this.addSql(`
        create function keep_${table}() returns trigger language plpgsql as $$
          declare moves constant text[] := array[${moves.map((name) => `'${name}'`).join(", ")}];
          begin
            if to_jsonb(new) - moves is distinct from to_jsonb(old) - moves then
              raise exception 'what a % is of never changes', tg_table_name using errcode = 'restrict_violation';
            end if;
            return new;
          end $$`);
      this.addSql(
        `create trigger keep_${table} before update on "${table}" for each row execute function keep_${table}()`,
      );
    }
    this.addSql(`
      create function delivery_of_its_program() returns trigger language plpgsql security definer set search_path = public, pg_temp as $$
        begin
          if not exists (select from webhook w where w.id = new.webhook_id and w.program_id = new.program_id) then
            raise exception 'a webhook hears of its own program alone' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger of_its_program before insert on "webhook_delivery" for each row execute function delivery_of_its_program()`,
    );
  }

  override down(): void {
    this.addSql(`drop table "webhook_delivery" cascade`);
    this.addSql(`drop table "webhook" cascade`);
    for (const name of Object.keys(MOVES)) this.addSql(`drop function keep_${name}()`);
    this.addSql(`drop function delivery_of_its_program()`);
    this.addSql(`drop function webhook_listeners(uuid, text)`);
  }
}
