import { Migration } from "@mikro-orm/migrations";

const TABLES = [
  "sheet",
  "sheet_revision",
  "sheet_document",
  "sheet_file",
  "sheet_comment",
  "deviation",
  "sheet_print",
] as const;
const ADD_ONLY = ["sheet_document", "sheet_file", "sheet_comment", "sheet_print"] as const;

const definer = "stable security definer set search_path = public, pg_temp";

/**
 * Sheets with their revisions. A released sheet is a controlled document, so the database itself holds what may move: a revision's state
 * goes forward only, what it rests on and who decided stays, and nothing is deleted but with the demo. A guest reads what is released of
 * their programs, and of the files the page for hands alone.
 */
export class ReviewAndRelease extends Migration {
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
    this.addWhatMoves();
    this.addGuests();
    this.addDoors();
  }

  private addTables(): void {
    this.addSql(
      `create table "sheet" ("id" uuid not null, "program_id" uuid not null, "flow_id" uuid not null, "number" int not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "sheet_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "sheet_revision" ("id" uuid not null, "program_id" uuid not null, "sheet_id" uuid not null, "assessment_id" uuid not null, "title" text not null, "number" int null, "state" text not null, "input_hash" text not null, "result_hash" text not null, "note" text not null, "asked_at" timestamptz not null, "asked_by_id" uuid not null, "decided_at" timestamptz null, "decided_by_id" uuid null, "reason" text null, "changes" jsonb null, "token" text null, "superseded_by" int null, "ended_at" timestamptz null, "ended_by_id" uuid null, "end_reason" text null, constraint "sheet_revision_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "sheet_document" ("id" uuid not null, "program_id" uuid not null, "revision_id" uuid not null, "leg" int not null, "document" jsonb not null, constraint "sheet_document_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "sheet_file" ("id" uuid not null, "program_id" uuid not null, "revision_id" uuid not null, "leg" int not null, "format" text not null, "paper" text not null, "pages" text not null, "mark" text not null, "sha256" text not null, "bytes" bytea not null, "created_at" timestamptz not null, constraint "sheet_file_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "sheet_comment" ("id" uuid not null, "program_id" uuid not null, "revision_id" uuid not null, "step" int null, "text" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "sheet_comment_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "deviation" ("id" uuid not null, "program_id" uuid not null, "revision_id" uuid not null, "findings" jsonb not null, "reason" text not null, "scope" text not null, "until" timestamptz not null, "created_at" timestamptz not null, "created_by_id" uuid not null, "signed_at" timestamptz null, "signed_by_id" uuid null, constraint "deviation_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "sheet_print" ("id" uuid not null, "program_id" uuid not null, "revision_id" uuid not null, "file_id" uuid not null, "place" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "sheet_print_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "sheet" add constraint "sheet_flow_id_unique" unique ("flow_id")`);
    this.addSql(`alter table "sheet" add constraint "sheet_program_id_number_unique" unique ("program_id", "number")`);
    this.addSql(`create index "sheet_revision_program_id_index" on "sheet_revision" ("program_id")`);
    this.addSql(`create index "sheet_revision_assessment_id_index" on "sheet_revision" ("assessment_id")`);
    this.addSql(`alter table "sheet_revision" add constraint "sheet_revision_token_unique" unique ("token")`);
    this.addSql(
      `create unique index "sheet_revision_one_in_review" on "sheet_revision" ("sheet_id") where state = 'in review'`,
    );
    this.addSql(
      `create unique index "sheet_revision_one_released" on "sheet_revision" ("sheet_id") where state = 'released'`,
    );
    this.addSql(
      `alter table "sheet_revision" add constraint "sheet_revision_sheet_id_number_unique" unique ("sheet_id", "number")`,
    );
    this.addSql(`create index "sheet_document_program_id_index" on "sheet_document" ("program_id")`);
    this.addSql(
      `alter table "sheet_document" add constraint "sheet_document_revision_id_leg_unique" unique ("revision_id", "leg")`,
    );
    this.addSql(`create index "sheet_file_program_id_index" on "sheet_file" ("program_id")`);
    this.addSql(
      `alter table "sheet_file" add constraint "sheet_file_revision_id_leg_format_paper_pages_mark_unique" unique ("revision_id", "leg", "format", "paper", "pages", "mark")`,
    );
    this.addSql(`create index "sheet_comment_program_id_index" on "sheet_comment" ("program_id")`);
    this.addSql(`create index "sheet_comment_revision_id_index" on "sheet_comment" ("revision_id")`);
    this.addSql(`create index "deviation_program_id_index" on "deviation" ("program_id")`);
    this.addSql(`create index "deviation_revision_id_index" on "deviation" ("revision_id")`);
    this.addSql(`create index "sheet_print_program_id_index" on "sheet_print" ("program_id")`);
    this.addSql(`create index "sheet_print_revision_id_index" on "sheet_print" ("revision_id")`);
    this.addSql(
      `alter table "sheet" add constraint "sheet_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet" add constraint "sheet_flow_id_foreign" foreign key ("flow_id") references "flow" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet" add constraint "sheet_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_revision" add constraint "sheet_revision_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_revision" add constraint "sheet_revision_sheet_id_foreign" foreign key ("sheet_id") references "sheet" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_revision" add constraint "sheet_revision_assessment_id_foreign" foreign key ("assessment_id") references "assessment" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_revision" add constraint "sheet_revision_asked_by_id_foreign" foreign key ("asked_by_id") references "person" ("id") on update cascade on delete restrict`,
    );
    this.addSql(
      `alter table "sheet_revision" add constraint "sheet_revision_decided_by_id_foreign" foreign key ("decided_by_id") references "person" ("id") on update cascade on delete restrict`,
    );
    this.addSql(
      `alter table "sheet_revision" add constraint "sheet_revision_ended_by_id_foreign" foreign key ("ended_by_id") references "person" ("id") on update cascade on delete restrict`,
    );
    this.addSql(
      `alter table "sheet_document" add constraint "sheet_document_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_document" add constraint "sheet_document_revision_id_foreign" foreign key ("revision_id") references "sheet_revision" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_file" add constraint "sheet_file_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_file" add constraint "sheet_file_revision_id_foreign" foreign key ("revision_id") references "sheet_revision" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_comment" add constraint "sheet_comment_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_comment" add constraint "sheet_comment_revision_id_foreign" foreign key ("revision_id") references "sheet_revision" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_comment" add constraint "sheet_comment_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "deviation" add constraint "deviation_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "deviation" add constraint "deviation_revision_id_foreign" foreign key ("revision_id") references "sheet_revision" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "deviation" add constraint "deviation_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "deviation" add constraint "deviation_signed_by_id_foreign" foreign key ("signed_by_id") references "person" ("id") on update cascade on delete restrict`,
    );
    this.addSql(
      `alter table "sheet_print" add constraint "sheet_print_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_print" add constraint "sheet_print_revision_id_foreign" foreign key ("revision_id") references "sheet_revision" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_print" add constraint "sheet_print_file_id_foreign" foreign key ("file_id") references "sheet_file" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "sheet_print" add constraint "sheet_print_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade`,
    );
  }

  /** What of a revision and of a deviation may still change, and in which order. */
  private addWhatMoves(): void {
    this.addSql(`
      create function keep_revision() returns trigger language plpgsql as $$
        begin
          if tg_op = 'DELETE' then
            if app_at_the_demo() then return old; end if;
            raise exception 'a revision of a sheet is never deleted' using errcode = 'restrict_violation';
          end if;
          if (new.id, new.program_id, new.sheet_id, new.assessment_id, new.title, new.input_hash, new.result_hash, new.note, new.asked_at, new.asked_by_id)
             is distinct from
             (old.id, old.program_id, old.sheet_id, old.assessment_id, old.title, old.input_hash, old.result_hash, old.note, old.asked_at, old.asked_by_id) then
            raise exception 'what a revision rests on never changes' using errcode = 'restrict_violation';
          end if;
          if old.state <> 'in review' and
             (new.number, new.token, new.decided_at, new.decided_by_id, new.reason, new.changes)
             is distinct from (old.number, old.token, old.decided_at, old.decided_by_id, old.reason, old.changes) then
            raise exception 'what was decided of a revision never changes' using errcode = 'restrict_violation';
          end if;
          if old.state in ('returned', 'superseded', 'withdrawn') and new is distinct from old then
            raise exception 'a revision that has ended never changes' using errcode = 'restrict_violation';
          end if;
          if new.state <> old.state and (old.state, new.state) not in
             (('in review', 'released'), ('in review', 'returned'), ('released', 'superseded'), ('released', 'withdrawn')) then
            raise exception 'a revision goes from % to % in no case', old.state, new.state using errcode = 'restrict_violation';
          end if;
          if (new.state in ('in review', 'returned')) <> (new.number is null) or (new.number is null) <> (new.token is null)
             or (new.state = 'in review') <> (new.decided_at is null) then
            raise exception 'a revision has letter, token and date of a decision as its state has them' using errcode = 'restrict_violation';
          end if;
          if new.state = 'released' and new.decided_by_id = new.asked_by_id then
            raise exception 'nobody releases what they have asked for themselves' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger keep_revision before update or delete on "sheet_revision" for each row execute function keep_revision()`,
    );
    this.addSql(`
      create function keep_deviation() returns trigger language plpgsql as $$
        begin
          if tg_op = 'DELETE' then
            if app_at_the_demo() then return old; end if;
            raise exception 'a deviation is never deleted' using errcode = 'restrict_violation';
          end if;
          if old.signed_at is not null or
             (new.id, new.program_id, new.revision_id, new.findings, new.reason, new.scope, new.until, new.created_at, new.created_by_id)
             is distinct from
             (old.id, old.program_id, old.revision_id, old.findings, old.reason, old.scope, old.until, old.created_at, old.created_by_id) then
            raise exception 'a deviation is signed once and else never changes' using errcode = 'restrict_violation';
          end if;
          if new.signed_by_id = new.created_by_id then
            raise exception 'a deviation takes two people' using errcode = 'restrict_violation';
          end if;
          return new;
        end $$`);
    this.addSql(
      `create trigger keep_deviation before update or delete on "deviation" for each row execute function keep_deviation()`,
    );
    this.addSql(`
      create function keep_sheet() returns trigger language plpgsql as $$
        begin
          if tg_op = 'DELETE' and app_at_the_demo() then return old; end if;
          raise exception 'a sheet keeps its number and its flow' using errcode = 'restrict_violation';
        end $$`);
    this.addSql(
      `create trigger keep_sheet before update or delete on "sheet" for each row execute function keep_sheet()`,
    );
  }

  private addGuests(): void {
    const released = (column: string) =>
      `exists (select 1 from sheet_revision r where r.${column} and r.state = 'released')`;
    const member = "program_id in (select app_member_programs())";
    this.addSql(`create policy guest_reads on "sheet_revision" for select using (${member} and state = 'released')`);
    this.addSql(
      `create policy guest_reads on "sheet" for select using (${member} and ${released("sheet_id = sheet.id")})`,
    );
    this.addSql(
      `create policy guest_reads on "sheet_file" for select using (${member} and pages = 'hands' and mark = '' and ${released("id = sheet_file.revision_id")})`,
    );
    this.addSql(
      `create policy guest_prints on "sheet_print" for insert with check (${member} and created_by_id = app_person())`,
    );
  }

  /** What is told to who may not read the tables: the status of a revision to who holds its paper, the people of a program to its staff. */
  private addDoors(): void {
    this.addSql(`
      create function sheet_status(asked text) returns table (
        slug text, sheet_number int, number int, state text, decided_at timestamptz, ended_at timestamptz, superseded_by int, next_token text,
        deviation_until timestamptz)
        language sql ${definer} as $$
        select p.slug, s.number, r.number, r.state, r.decided_at, r.ended_at, r.superseded_by,
               (select n.token from sheet_revision n where n.sheet_id = r.sheet_id and n.state = 'released'),
               (select min(d.until) from deviation d where d.revision_id = r.id and d.signed_at is not null)
          from sheet_revision r join sheet s on s.id = r.sheet_id join program p on p.id = r.program_id
         where r.token = asked $$`);
    this.addSql(`
      create function program_people(asked uuid) returns table (id uuid, name text, role text)
        language sql ${definer} as $$
        select p.id, p.name, m.role from membership m join person p on p.id = m.person_id
         where m.program_id = asked and p.active and asked in (select app_staff_programs()) $$`);
  }

  override down(): void {
    this.addSql(`drop function program_people(uuid)`);
    this.addSql(`drop function sheet_status(text)`);
    this.addSql(`drop policy guest_reads on "sheet_file"`);
    this.addSql(`drop policy guest_reads on "sheet"`);
    for (const table of TABLES.toReversed()) this.addSql(`drop table "${table}" cascade`);
    for (const name of ["keep_sheet", "keep_deviation", "keep_revision"]) this.addSql(`drop function ${name}()`);
  }
}
