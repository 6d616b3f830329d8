import { Migration } from "@mikro-orm/migrations";

const TABLES = ["stack_layer", "flow_step_film"];

/** A film of a stack or of a step may be cut in lines. Those that are there bend both directions alike. */
export class FilmLines extends Migration {
  override up(): void {
    for (const table of TABLES) this.addSql(`alter table "${table}" add column "lines" jsonb null`);
  }

  override down(): void {
    for (const table of TABLES) this.addSql(`alter table "${table}" drop column "lines"`);
  }
}
