import { Migration } from "@mikro-orm/migrations";

/** A debond says which face it lets go. Nobody has said it of the steps that are there. */
export class DebondFace extends Migration {
  override up(): void {
    this.addSql(`update "flow_step" set handling = '{"debondFace": null}'::jsonb || handling`);
  }

  override down(): void {
    this.addSql(`update "flow_step" set handling = handling - 'debondFace'`);
  }
}
