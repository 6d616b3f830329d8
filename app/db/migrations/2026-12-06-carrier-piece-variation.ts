import { Migration } from "@mikro-orm/migrations";

/** A piece of a carrier keeps its own thickness variation once somebody has measured it. */
export class CarrierPieceVariation extends Migration {
  override up(): void {
    this.addSql(`alter table "carrier_unit" add column "thickness_variation" jsonb null`);
  }

  override down(): void {
    this.addSql(`alter table "carrier_unit" drop column "thickness_variation"`);
  }
}
