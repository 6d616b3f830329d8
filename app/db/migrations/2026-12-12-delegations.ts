import { Migration } from "@mikro-orm/migrations";

const REFERENCES = { program_id: "program", owner_id: "person", delegate_id: "person", ended_by_id: "person" } as const;

const definer = "stable security definer set search_path = public, pg_temp";

/**
 * Who stands in for whom. Only a process owner names somebody, for themselves alone and among the staff of the program; afterwards
 * nothing of it moves but an early end, which either of the two may put to it. `people_stood_in_for` says for whom a person stands in
 * now: for nobody who is no process owner any more.
 */
export class Delegations extends Migration {
  override up(): void {
    this.addSql(
      `create table "delegation" ("id" uuid not null, "program_id" uuid not null, "owner_id" uuid not null, "delegate_id" uuid not null, "begins_at" timestamptz not null, "ends_at" timestamptz not null, "reason" text not null, "created_at" timestamptz not null, "ended_at" timestamptz null, "ended_by_id" uuid null, constraint "delegation_pkey" primary key ("id"))`,
    );
    for (const column of ["program_id", "delegate_id"])
      this.addSql(`create index "delegation_${column}_index" on "delegation" ("${column}")`);
    for (const [column, table] of Object.entries(REFERENCES))
      this.addSql(
        `alter table "delegation" add constraint "delegation_${column}_foreign" foreign key ("${column}") references "${table}" ("id") on update cascade on delete ${column === "ended_by_id" ? "restrict" : "no action"}`,
      );
    this.addSql(`
      create function keep_delegation() returns trigger language plpgsql as $$
        begin
          if tg_op = 'DELETE' then
            if app_at_the_demo() then return old; end if;
            raise exception 'a delegation is never deleted' using errcode = 'restrict_violation';
          end if;
          if old.ended_at is not null or
             (new.id, new.program_id, new.owner_id, new.delegate_id, new.begins_at, new.ends_at, new.reason, new.created_at)
             is distinct from
             (old.id, old.program_id, old.owner_id, old.delegate_id, old.begins_at, old.ends_at, old.reason, old.created_at) then
            raise exception 'a delegation is ended once and else never changes' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger keep_delegation before update or delete on "delegation" for each row execute function keep_delegation()`,
    );
    this.addSql(`
      create function people_stood_in_for(asked uuid) returns table (program_id uuid, person_id uuid, name text, ends_at timestamptz)
        language sql ${definer} as $$
        select d.program_id, p.id, p.name, d.ends_at
          from delegation d
          join person p on p.id = d.owner_id and p.active
          join membership m on m.person_id = p.id and m.program_id = d.program_id and m.role = 'process owner'
         where d.delegate_id = asked and d.ended_at is null and d.begins_at <= now() and d.ends_at > now()
           and asked = app_person() $$`);
    this.addSql(`drop function program_people(uuid)`);
    this.addSql(`
      create function program_people(asked uuid) returns table (id uuid, name text, role text, stands_in boolean)
        language sql ${definer} as $$
        select p.id, p.name, m.role,
               exists (select 1 from delegation d join person o on o.id = d.owner_id and o.active
                         join membership h on h.person_id = o.id and h.program_id = d.program_id and h.role = 'process owner'
                        where d.program_id = asked and d.delegate_id = p.id and d.ended_at is null
                          and d.begins_at <= now() and d.ends_at > now())
          from membership m join person p on p.id = m.person_id
         where m.program_id = asked and p.active and asked in (select app_staff_programs()) $$`);
    this.addWalls();
  }

  private addWalls(): void {
    this.addSql(`alter table "delegation" enable row level security`);
    const staff = "program_id in (select app_staff_programs())";
    this.addSql(`create policy staff_reads on "delegation" for select using (${staff})`);
    this.addSql(
      `create policy owner_names on "delegation" for insert
         with check (owner_id = app_person() and owner_id <> delegate_id and begins_at < ends_at and ended_at is null
           and exists (select 1 from membership m where m.person_id = app_person() and m.program_id = delegation.program_id and m.role = 'process owner')
           and exists (select 1 from program_people(delegation.program_id) s where s.id = delegate_id and s.role not in ('guest', 'process owner')))`,
    );
    this.addSql(
      `create policy either_ends on "delegation" for update using (${staff} and app_person() in (owner_id, delegate_id))
         with check (ended_by_id = app_person())`,
    );
  }

  override down(): void {
    this.addSql(`drop function people_stood_in_for(uuid)`);
    this.addSql(`drop table "delegation" cascade`);
    this.addSql(`drop function keep_delegation()`);
    this.addSql(`drop function program_people(uuid)`);
    this.addSql(`
      create function program_people(asked uuid) returns table (id uuid, name text, role text)
        language sql ${definer} as $$
        select p.id, p.name, m.role from membership m join person p on p.id = m.person_id
         where m.program_id = asked and p.active and asked in (select app_staff_programs()) $$`);
  }
}
