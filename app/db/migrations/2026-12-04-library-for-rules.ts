import { Migration } from "@mikro-orm/migrations";

/** Nothing is given yet: what it was then, whatever is asked later. */
const ASKED = {
  carrier: ["metalInLight", "conductiveCoating", "seenBySensors"],
  bonding_material: [
    ...["vacuum", "plasma", "solvent", "acid", "base", "ultraviolet", "remover"],
    ...["vacuumTemperatureLimit", "weightLoss", "limitTime", "thermalTime", "releaseLight", "peelForce", "peelRadius"],
  ],
  equipment: [
    ...["clamping", "seal", "sealGap", "slotClearance", "weightLimit", "totalThicknessLimit"],
    ...["sensesOptically", "contactFace", "contactMeans", "ioniser"],
  ],
  film: ["solderMelting", "stressState", "stressFilmThickness", "monitorThickness", "monitorDiameter"],
};

/** Words for a tool's hold that leave no doubt how it clamps. */
const CLAMPING = {
  vacuum: "vacuum",
  "full-area vacuum": "full-area vacuum",
  "edge grip": "edge grip",
  head: "polishing head",
  "free in boat": "boat",
  "free on proximity pins": "pins",
  frame: "frame",
};

/** The library says what the handling rules ask, and which pieces of a carrier there are. What is there already has given none of it. */
export class LibraryForRules extends Migration {
  override up(): void {
    for (const [table, fields] of Object.entries(ASKED)) {
      const lists = table === "bonding_material" ? { attackedBy: [] } : {};
      const blank = { ...Object.fromEntries(fields.map((field) => [field, null])), ...lists };
      this.addSql(`alter table "${table}" add column "handling" jsonb null`);
      this.addSql(`update "${table}" set handling = '${JSON.stringify(blank)}'`);
      this.addSql(`alter table "${table}" alter column "handling" set not null`);
    }
    for (const [words, clamping] of Object.entries(CLAMPING))
      this.addSql(
        `update "equipment" set handling = jsonb_set(handling, '{clamping}', '"${clamping}"') where holding = '${words}'`,
      );
    this.addSql(
      `create table "carrier_unit" ("id" uuid not null, "carrier_id" uuid not null, "mark" text not null, "uses" int not null, "state" text not null, "last_used_on" date null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "carrier_unit_pkey" primary key ("id"))`,
    );
    this.addSql(
      `alter table "carrier_unit" add constraint "carrier_unit_carrier_id_mark_unique" unique ("carrier_id", "mark")`,
    );
    for (const [column, table, more] of [
      ["carrier_id", "carrier", ""],
      ["created_by_id", "person", " on delete set null"],
      ["updated_by_id", "person", " on delete set null"],
    ])
      this.addSql(
        `alter table "carrier_unit" add constraint "carrier_unit_${column}_foreign" foreign key ("${column}") references "${table}" ("id") on update cascade${more}`,
      );
    this.addSql(`alter table "carrier_unit" enable row level security`);
    this.addSql(
      `create policy staff_only on "carrier_unit" using ((select app_is_staff())) with check ((select app_is_staff()))`,
    );
  }

  override down(): void {
    this.addSql(`drop table "carrier_unit" cascade`);
    for (const table of Object.keys(ASKED)) this.addSql(`alter table "${table}" drop column "handling"`);
  }
}
