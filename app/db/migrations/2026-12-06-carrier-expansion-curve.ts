import { Migration } from "@mikro-orm/migrations";

/** A carrier may have its expansion as a curve over temperature. Those that are there keep their mean. */
export class CarrierExpansionCurve extends Migration {
  override up(): void {
    this.addSql(`alter table "carrier" add column "expansion_curve" jsonb null`);
  }

  override down(): void {
    this.addSql(`alter table "carrier" drop column "expansion_curve"`);
  }
}
