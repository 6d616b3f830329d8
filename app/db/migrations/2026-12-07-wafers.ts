import { Migration } from "@mikro-orm/migrations";

const TABLES = ["lot", "wafer", "wafer_scan", "wafer_measurement"];

/** Column, the table that it points to, and what becomes of the row when that is deleted. */
const FOREIGN = [
  ["lot", "program_id", "program", ""],
  ["lot", "created_by_id", "person", ""],
  ["wafer", "program_id", "program", ""],
  ["wafer", "lot_id", "lot", "restrict"],
  ["wafer", "created_by_id", "person", ""],
  ["wafer_scan", "program_id", "program", ""],
  ["wafer_scan", "reading_id", "scan_reading", ""],
  ["wafer_scan", "wafer_id", "wafer", ""],
  ["wafer_scan", "instrument_id", "import_profile", "set null"],
  ["wafer_scan", "created_by_id", "person", ""],
  ["wafer_measurement", "program_id", "program", ""],
  ["wafer_measurement", "wafer_id", "wafer", ""],
  ["wafer_measurement", "reading_id", "scan_reading", ""],
  ["wafer_measurement", "created_by_id", "person", ""],
  ["scan", "wafer_id", "wafer", "restrict"],
  ["scan", "instrument_id", "import_profile", "set null"],
  ["scan", "before_scan_id", "wafer_scan", "restrict"],
  ["scan", "after_scan_id", "wafer_scan", "restrict"],
] as const;

const INDEXES = [
  ["wafer", "lot_id"],
  ["wafer_scan", "program_id"],
  ["wafer_scan", "wafer_id"],
  ["wafer_measurement", "program_id"],
  ["wafer_measurement", "wafer_id"],
  ["scan", "wafer_id"],
  ["scan", "before_scan_id"],
  ["scan", "after_scan_id"],
] as const;

/** Lots, wafers and what was measured of them: scans that wait for their partner, rows of summaries, maps and reduced stresses. */
export class Wafers extends Migration {
  override up(): void {
    this.addSql(
      `create table "lot" ("id" uuid not null, "program_id" uuid not null, "name" text not null, "note" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "lot_pkey" primary key ("id"))`,
    );
    this.addSql(`create unique index "lot_program_id_name_unique" on "lot" ("program_id", lower("name"))`);
    this.addSql(
      `create table "wafer" ("id" uuid not null, "program_id" uuid not null, "lot_id" uuid null, "slot" int null, "name" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "wafer_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create unique index "wafer_program_id_lot_id_name_unique" on "wafer" ("program_id", "lot_id", lower("name")) nulls not distinct`,
    );
    this.addSql(
      `create table "wafer_scan" ("id" uuid not null, "program_id" uuid not null, "reading_id" uuid not null, "profile" int not null, "wafer_id" uuid not null, "azimuth" double precision not null, "side" text not null, "instrument_id" uuid null, "instrument_name" text not null, "measured_at" timestamptz null, "subject" jsonb not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "wafer_scan_pkey" primary key ("id"))`,
    );
    this.addSql(
      `alter table "wafer_scan" add constraint "wafer_scan_reading_id_profile_wafer_id_azimuth_side_unique" unique ("reading_id", "profile", "wafer_id", "azimuth", "side")`,
    );
    this.addSql(
      `create table "wafer_measurement" ("id" uuid not null, "program_id" uuid not null, "wafer_id" uuid not null, "reading_id" uuid not null, "kind" text not null, "content" jsonb not null, "measured_at" timestamptz null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "wafer_measurement_pkey" primary key ("id"))`,
    );
    this.addSql(
      `alter table "wafer_measurement" add constraint "wafer_measurement_reading_id_wafer_id_unique" unique ("reading_id", "wafer_id")`,
    );
    this.addSql(
      `alter table "scan" add column "wafer_id" uuid null, add column "azimuth" double precision null, add column "instrument_id" uuid null, add column "instrument_name" text not null default '', add column "before_scan_id" uuid null, add column "after_scan_id" uuid null`,
    );
    for (const [table, column, other, onDelete] of FOREIGN)
      this.addSql(
        `alter table "${table}" add constraint "${table}_${column}_foreign" foreign key ("${column}") references "${other}" ("id") on update cascade${onDelete && ` on delete ${onDelete}`}`,
      );
    for (const [table, column] of INDEXES)
      this.addSql(`create index "${table}_${column}_index" on "${table}" ("${column}")`);
    for (const table of TABLES) {
      this.addSql(`alter table "${table}" enable row level security`);
      this.addSql(
        `create policy program_wall on "${table}" using (program_id in (select app_staff_programs())) with check (program_id in (select app_staff_programs()))`,
      );
    }
  }

  override down(): void {
    for (const [table, column] of FOREIGN)
      if (table === "scan") this.addSql(`alter table "scan" drop column "${column}"`);
    this.addSql(`alter table "scan" drop column "azimuth", drop column "instrument_name"`);
    for (const table of TABLES.toReversed()) this.addSql(`drop table "${table}"`);
  }
}
