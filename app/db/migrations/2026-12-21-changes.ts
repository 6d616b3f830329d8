import { Migration } from "@mikro-orm/migrations";

/** Tables whose changes are told, as what, and the column with the id of that. */
const TOLD = [
  ["stack", "stack", "id", "update"],
  ["flow", "flow", "id", "update"],
  ["assessment", "flow", "flow_id", "insert"],
  ["sheet_revision", "sheet", "sheet_id", "insert or update"],
  ["job", "job", "id", "update"],
] as const;

/**
 * Tells every web process, when a transaction ends well, that a record has changed: which one and by whom, and nothing of what it holds.
 */
export class Changes extends Migration {
  override up(): void {
    this.addSql(`
      create function tell_change() returns trigger language plpgsql as $$
        begin
          perform pg_notify('planeward_changes',
            tg_argv[0] || ':' || (to_jsonb(new) ->> tg_argv[1]) || ' ' || coalesce(current_setting('app.person', true), ''));
          return null;
        end $$`);
    for (const [table, what, column, when] of TOLD)
      this.addSql(
        `create trigger tell_change after ${when} on "${table}" for each row execute function tell_change('${what}', '${column}')`,
      );
  }

  override down(): void {
    for (const [table] of TOLD) this.addSql(`drop trigger tell_change on "${table}"`);
    this.addSql(`drop function tell_change()`);
  }
}
