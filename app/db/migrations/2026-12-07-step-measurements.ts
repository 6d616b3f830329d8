import { Migration } from "@mikro-orm/migrations";

/** Column, the table that it points to, and what becomes of the row when that is deleted. */
const FOREIGN = [
  ["program_id", "program", ""],
  ["assessment_id", "assessment", ""],
  ["measurement_id", "wafer_measurement", " on delete restrict"],
  ["set_aside_by_id", "person", " on delete set null"],
  ["created_by_id", "person", ""],
] as const;

/** Bows that were measured after a step of an assessed flow. */
export class StepMeasurements extends Migration {
  override up(): void {
    this.addSql(
      `create table "step_measurement" ("id" uuid not null, "program_id" uuid not null, "assessment_id" uuid not null, "step" int not null, "step_title" text not null, "lot" text not null, "wafer" text not null, "measurement_id" uuid null, "bow" double precision not null, "standard_uncertainty" double precision not null, "stated" boolean not null, "predicted" double precision not null, "predicted_uncertainty" double precision not null, "instrument" text not null, "measured_at" timestamptz not null, "set_aside_reason" text null, "set_aside_at" timestamptz null, "set_aside_by_id" uuid null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "step_measurement_pkey" primary key ("id"))`,
    );
    this.addSql(
      `alter table "step_measurement" add constraint "step_measurement_assessment_id_step_measurement_id_unique" unique ("assessment_id", "step", "measurement_id")`,
    );
    for (const column of ["program_id", "assessment_id"])
      this.addSql(`create index "step_measurement_${column}_index" on "step_measurement" ("${column}")`);
    for (const [column, other, deleted] of FOREIGN)
      this.addSql(
        `alter table "step_measurement" add constraint "step_measurement_${column}_foreign" foreign key ("${column}") references "${other}" ("id") on update cascade${deleted}`,
      );
    this.addSql(`alter table "step_measurement" enable row level security`);
    this.addSql(
      `create policy program_wall on "step_measurement" using (program_id in (select app_staff_programs())) with check (program_id in (select app_staff_programs()))`,
    );
  }

  override down(): void {
    this.addSql(`drop table "step_measurement" cascade`);
  }
}
