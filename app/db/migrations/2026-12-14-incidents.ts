import { Migration } from "@mikro-orm/migrations";

const TABLES = ["incident", "incident_note", "incident_photo"] as const;
const ADD_ONLY = ["incident_note", "incident_photo"] as const;

const refuse = (sentence: string) => `raise exception '${sentence}' using errcode = 'restrict_violation'`;

/**
 * Incidents with their notes and photos. What was reported never changes: the database lets only the state move, only along with a note
 * that says so, and only forward, from closed back to open.
 */
export class Incidents extends Migration {
  override up(): void {
    this.addTables();
    for (const table of TABLES) {
      this.addSql(`alter table "${table}" enable row level security`);
      this.addSql(
        `create policy program_wall on "${table}" using (program_id in (select app_staff_programs())) with check (program_id in (select app_staff_programs()))`,
      );
    }
    for (const table of ADD_ONLY)
      this.addSql(
        `create trigger never_changes before update or delete on "${table}" for each row execute function refuse_change()`,
      );
    this.addKeptIncident();
    this.addKeptParts();
  }

  private addTables(): void {
    this.addSql(
      `create table "incident" ("id" uuid not null, "program_id" uuid not null, "number" int not null, "assessment_id" uuid not null, "leg" int not null, "step" int not null, "step_kind" text not null, "step_title" text not null, "silicon" double precision not null, "planned" text not null, "required" text not null, "warp" double precision null, "warp_uncertainty" double precision null, "films" text not null, "lot_id" uuid not null, "wafer_id" uuid null, "kind" text not null, "severity" text not null, "radius" double precision null, "azimuth" double precision null, "affected" int not null, "broken" int not null, "through" int null, "words" text not null, "occurred_at" timestamptz not null, "state" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "incident_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "incident_note" ("id" uuid not null, "program_id" uuid not null, "incident_id" uuid not null, "state" text not null, "text" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "incident_note_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "incident_photo" ("id" uuid not null, "program_id" uuid not null, "incident_id" uuid not null, "type" text not null, "width" int not null, "height" int not null, "size" int not null, "sha256" text not null, "bytes" bytea not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "incident_photo_pkey" primary key ("id"))`,
    );
    this.addSql(
      `alter table "incident" add constraint "incident_program_id_number_unique" unique ("program_id", "number")`,
    );
    this.addSql(
      `alter table "incident_photo" add constraint "incident_photo_incident_id_sha256_unique" unique ("incident_id", "sha256")`,
    );
    for (const [table, column] of [
      ["incident", "assessment_id"],
      ["incident", "lot_id"],
      ["incident", "wafer_id"],
      ["incident_note", "program_id"],
      ["incident_note", "incident_id"],
      ["incident_photo", "program_id"],
    ] as const)
      this.addSql(`create index "${table}_${column}_index" on "${table}" ("${column}")`);
    for (const [table, column, other, onDelete] of [
      ["incident", "program_id", "program", ""],
      ["incident", "assessment_id", "assessment", ""],
      ["incident", "lot_id", "lot", "restrict"],
      ["incident", "wafer_id", "wafer", "restrict"],
      ["incident", "created_by_id", "person", ""],
      ["incident_note", "program_id", "program", ""],
      ["incident_note", "incident_id", "incident", ""],
      ["incident_note", "created_by_id", "person", ""],
      ["incident_photo", "program_id", "program", ""],
      ["incident_photo", "incident_id", "incident", ""],
      ["incident_photo", "created_by_id", "person", ""],
    ] as const)
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_foreign" foreign key ("${column}") references "${other}" ("id") on update cascade${onDelete && ` on delete ${onDelete}`}`,
      );
  }

  /** What an incident must be when it comes, and that of it only the state moves. */
  private addKeptIncident(): void {
    this.addSql(`
      create function keep_incident() returns trigger language plpgsql as $$
        begin
          if tg_op = 'DELETE' then
            if app_at_the_demo() then return old; end if;
            ${refuse("an incident is never deleted")};
          end if;
          if tg_op = 'INSERT' then
            if new.state <> 'open' then ${refuse("an incident begins open")}; end if;
            if new.kind not in ('crack', 'chip', 'edge chip', 'delamination', 'void', 'slip', 'drop', 'other')
               or new.severity not in ('near miss', 'damaged, goes on', 'wafer lost', 'danger to people') then
              ${refuse("an incident has one of the known kinds and severities")};
            end if;
            if (new.radius is null) <> (new.azimuth is null) or not coalesce(new.radius between 0 and 1, true)
               or not coalesce(new.azimuth >= 0 and new.azimuth < 2 * pi(), true) then
              ${refuse("a place on a wafer lies on the wafer")};
            end if;
            if new.affected < 1 or new.broken < 0 or new.broken > new.affected or not coalesce(new.through >= new.affected, true) then
              ${refuse("of the wafers that went through some are affected, and some of those are broken")};
            end if;
            if new.occurred_at > new.created_at + interval '5 minutes' then
              ${refuse("an incident is reported after it happened")};
            end if;
            if not exists (select 1 from assessment a where a.id = new.assessment_id and a.program_id = new.program_id)
               or not exists (select 1 from lot l where l.id = new.lot_id and l.program_id = new.program_id)
               or (new.wafer_id is not null and not exists
                    (select 1 from wafer w where w.id = new.wafer_id and w.program_id = new.program_id and w.lot_id = new.lot_id)) then
              ${refuse("assessment, lot and wafer of an incident are of one program")};
            end if;
            return new;
          end if;
          if to_jsonb(new) - 'state' is distinct from to_jsonb(old) - 'state' then
            ${refuse("what was reported of an incident never changes")};
          end if;
          if new.state <> old.state then
            if (old.state, new.state) not in
               (('open', 'followed up'), ('open', 'closed'), ('followed up', 'closed'), ('closed', 'open')) then
              raise exception 'an incident goes from % to % in no case', old.state, new.state using errcode = 'restrict_violation';
            end if;
            if new.state is distinct from
               (select n.state from incident_note n where n.incident_id = new.id order by n.created_at desc, n.id desc limit 1) then
              ${refuse("the state of an incident moves with a note that says why")};
            end if;
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger keep_incident before insert or update or delete on "incident" for each row execute function keep_incident()`,
    );
  }

  /** Notes and photos belong to the program of their incident; one that is closed takes none but the note that opens it again. */
  private addKeptParts(): void {
    this.addSql(`
      create function keep_incident_part() returns trigger language plpgsql as $$
        declare
          of incident%rowtype;
          opens boolean := false;
        begin
          select * into of from incident where id = new.incident_id for update;
          if of.program_id is distinct from new.program_id then
            ${refuse("what is added to an incident is of its program")};
          end if;
          if tg_table_name = 'incident_note' then
            if new.state not in ('open', 'followed up', 'closed') or btrim(new.text) = '' then
              ${refuse("a note has a state and says something")};
            end if;
            opens := new.state = 'open';
            if opens and of.state = 'followed up' then
              ${refuse("an incident that is followed up does not go back to open")};
            end if;
          elsif (select count(*) from incident_photo p where p.incident_id = new.incident_id) >= 6 then
            ${refuse("an incident has up to six photos")};
          end if;
          if of.state = 'closed' and not opens then
            ${refuse("nothing is added to an incident that is closed")};
          end if;
          return new;
        end $$`);
    for (const table of ADD_ONLY)
      this.addSql(
        `create trigger keep_incident_part before insert on "${table}" for each row execute function keep_incident_part()`,
      );
  }

  override down(): void {
    for (const table of TABLES.toReversed()) this.addSql(`drop table "${table}" cascade`);
    for (const name of ["keep_incident_part", "keep_incident"]) this.addSql(`drop function ${name}()`);
  }
}
