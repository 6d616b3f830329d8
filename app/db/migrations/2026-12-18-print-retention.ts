import { Migration } from "@mikro-orm/migrations";

/**
 * How long a program keeps who printed its sheets. What is older goes by one function alone, which leaves in the trail how many went: the
 * application itself can only add prints.
 */
export class PrintRetention extends Migration {
  override up(): void {
    this.addSql(`alter table "program" add column "prints_kept_years" int null`);
    this.addSql(`
      create function keep_print() returns trigger language plpgsql as $$
        begin
          if tg_op = 'DELETE' and (app_at_the_demo() or old.created_at <
             (select now() - make_interval(years => prints_kept_years) from program where id = old.program_id)) then
            return old;
          end if;
          raise exception 'a print of a sheet is never changed, and goes only when its program keeps it no longer'
            using errcode = 'restrict_violation';
        end $$`);
    this.addSql(`drop trigger never_changes on "sheet_print"`);
    this.addSql(
      `create trigger keep_print before update or delete on "sheet_print" for each row execute function keep_print()`,
    );
    this.addSql(`
      create function forget_old_prints(request text) returns int
        language plpgsql security definer set search_path = public, pg_temp as $$
        declare kept record; gone int; total int := 0;
        begin
          for kept in select id, now() - make_interval(years => prints_kept_years) as since
                        from program where prints_kept_years is not null order by id loop
            delete from sheet_print where program_id = kept.id and created_at < kept.since;
            get diagnostics gone = row_count;
            if gone > 0 then
              insert into audit_event (id, at, actor_id, program_id, action, subject, subject_id, field, "from", "to", request_id)
                values (gen_random_uuid(), now(), null, kept.id, 'removed', 'prints of sheets', kept.id, null,
                        jsonb_build_object('count', gone, 'before', kept.since), null, request);
              total := total + gone;
            end if;
          end loop;
          return total;
        end $$`);
  }

  override down(): void {
    this.addSql(`drop function forget_old_prints(text)`);
    this.addSql(`drop trigger keep_print on "sheet_print"`);
    this.addSql(`drop function keep_print()`);
    this.addSql(
      `create trigger never_changes before update or delete on "sheet_print" for each row execute function refuse_change()`,
    );
    this.addSql(`alter table "program" drop column "prints_kept_years"`);
  }
}
