import { Migration } from "@mikro-orm/migrations";

/** An assessment may be of one lot. Those that are there are of their flows, and no stored row is rewritten. */
export class AssessmentLot extends Migration {
  override up(): void {
    this.addSql(`alter table "assessment" add column "lot_number" int not null default 0, add column "lot" jsonb null`);
    this.addSql(`alter table "assessment" drop constraint "assessment_flow_id_number_unique"`);
    this.addSql(
      `alter table "assessment" add constraint "assessment_flow_id_number_lot_number_unique" unique ("flow_id", "number", "lot_number")`,
    );
  }

  override down(): void {
    // Without the column a lot would pass for a revision of its flow.
    this.addSql(`alter table "assessment" disable trigger never_changes`);
    this.addSql(`delete from "assessment" where lot is not null`);
    this.addSql(`alter table "assessment" enable trigger never_changes`);
    this.addSql(`alter table "assessment" drop constraint "assessment_flow_id_number_lot_number_unique"`);
    this.addSql(
      `alter table "assessment" add constraint "assessment_flow_id_number_unique" unique ("flow_id", "number")`,
    );
    this.addSql(`alter table "assessment" drop column "lot", drop column "lot_number"`);
  }
}
