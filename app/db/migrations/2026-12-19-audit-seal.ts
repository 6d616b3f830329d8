import { Migration } from "@mikro-orm/migrations";

const definer = "security definer set search_path = public, pg_temp";
/** The chain of what belongs to the site and to no program. */
const SITE = "00000000-0000-0000-0000-000000000000";

/**
 * Seals the audit trail: every event gets a number in the chain of its program and a hash over itself and the hash before it, so that an
 * event that was changed, taken out or put in shows, even where somebody got past every other rule. Events are sealed a moment after
 * they were written, one pass after the other, so that two people who work in one program do not wait for each other.
 */
export class AuditSeal extends Migration {
  override up(): void {
    this.addSql(`create index "audit_event_at_index" on "audit_event" ("at")`);
    this.addSql(
      `create table "audit_seal" ("event_id" uuid not null, "chain" uuid not null, "number" int not null, "hash" text not null, "sealed_at" timestamptz not null, constraint "audit_seal_pkey" primary key ("event_id"))`,
    );
    this.addSql(`alter table "audit_seal" add constraint "audit_seal_chain_number_unique" unique ("chain", "number")`);
    this.addSql(`create index "audit_seal_sealed_at_index" on "audit_seal" ("sealed_at")`);
    this.addSql(`
      create function audit_hash(before text, event audit_event) returns text language sql stable as $$
        select encode(sha256(convert_to(before || jsonb_build_object(
          'id', event.id, 'at', to_char(event.at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US'),
          'actor', event.actor_id, 'program', event.program_id, 'action', event.action, 'subject', event.subject,
          'subject_id', event.subject_id, 'field', event.field, 'from', event."from", 'to', event."to",
          'request', event.request_id)::text, 'UTF8')), 'hex') $$`);
    // An event is looked for so far back from the newest seal, since a transaction may commit after a later one.
    this.addSql(`
      create function seal_audit() returns int language plpgsql ${definer} as $$
        declare event audit_event; here uuid; last_chain uuid; last_number int; last_hash text; sealed int := 0;
        begin
          perform pg_advisory_xact_lock(hashtextextended('seal of the audit trail', 0));
          for event in
            select e.* from audit_event e
             where e.at > coalesce((select max(sealed_at) from audit_seal), '-infinity') - interval '1 day'
               and not exists (select 1 from audit_seal s where s.event_id = e.id)
             order by coalesce(e.program_id, '${SITE}'), e.at, e.id limit 50000
          loop
            here := coalesce(event.program_id, '${SITE}');
            if last_chain is distinct from here then
              last_chain := here;
              select number, hash into last_number, last_hash from audit_seal where chain = here order by number desc limit 1;
              if not found then last_number := 0; last_hash := ''; end if;
            end if;
            last_number := last_number + 1;
            last_hash := audit_hash(last_hash, event);
            insert into audit_seal (event_id, chain, number, hash, sealed_at)
              values (event.id, here, last_number, last_hash, clock_timestamp());
            sealed := sealed + 1;
          end loop;
          return sealed;
        end $$`);
    this.addSql(`
      create function audit_faults() returns table (chain uuid, number int, event_id uuid, fault text)
        language plpgsql stable ${definer} as $$
        declare seal audit_seal; event audit_event; last_chain uuid; last_number int; last_hash text;
        begin
          for seal in select s.* from audit_seal s order by s.chain, s.number loop
            if last_chain is distinct from seal.chain then last_chain := seal.chain; last_number := 0; last_hash := ''; end if;
            chain := seal.chain; number := seal.number; event_id := seal.event_id;
            if seal.number <> last_number + 1 then fault := 'seals before it are gone'; return next; end if;
            select e.* into event from audit_event e where e.id = seal.event_id;
            if not found then fault := 'its event is gone'; return next;
            elsif seal.hash <> audit_hash(last_hash, event) then
              fault := 'it, or what was before it, has been changed'; return next;
            end if;
            last_number := seal.number; last_hash := seal.hash;
          end loop;
          for event in select e.* from audit_event e
                        where e.at < now() - interval '1 hour' and not exists (select 1 from audit_seal s where s.event_id = e.id) loop
            chain := coalesce(event.program_id, '${SITE}'); number := null; event_id := event.id;
            fault := 'it was never sealed'; return next;
          end loop;
        end $$`);
    this.addSql(
      `create trigger never_changes before update or delete on "audit_seal" for each row execute function refuse_change()`,
    );
    this.addSql(`alter table "audit_seal" enable row level security`);
    this.addSql(`create policy administrator_reads on "audit_seal" for select using ((select app_is_administrator()))`);
  }

  override down(): void {
    this.addSql(`drop function audit_faults()`);
    this.addSql(`drop function seal_audit()`);
    this.addSql(`drop function audit_hash(text, audit_event)`);
    this.addSql(`drop table "audit_seal"`);
    this.addSql(`drop index "audit_event_at_index"`);
  }
}
