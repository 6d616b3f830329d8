import { Migration } from "@mikro-orm/migrations";

/** Steps say what the handling rules ask of them, flows what they take in. What is there already has given none of it. */
export class FlowHandling extends Migration {
  override up(): void {
    const times = ["solvent", "dehydrationBake", "contactFace", "contactMeans", "timeSincePrevious", "inLine"];
    const figures = ["bumpHeight", "bumpPeelForce", "topography", "viaProtrusion", "thicknessVariation"];
    const bond = ["bondFace", "bondThicknessVariation"];
    const tape = ["Name", "TemperatureLimit", "EmbeddingDepth", "ThicknessVariation", "LongestTime", "ReleasesInLight"];
    const stands = ["Vacuum", "Plasma", "Solvent", "Acid", "Base", "Ultraviolet"];
    const fields = [...times, ...figures, ...bond, ...[...tape, ...stands].map((name) => `tape${name}`)];
    const blank = JSON.stringify({ exposureTimes: {}, ...Object.fromEntries(fields.map((field) => [field, null])) });
    this.addSql(`alter table "flow_step" add column "handling" jsonb null`);
    this.addSql(`update "flow_step" set handling = '${blank}'`);
    this.addSql(`alter table "flow_step" alter column "handling" set not null`);
    this.addSql(`alter table "flow" add column "wafer_kind" text null`);
    this.addSql(`update "flow" set wafer_kind = 'silicon wafer'`);
    this.addSql(`alter table "flow" alter column "wafer_kind" set not null`);
    this.addSql(`alter table "flow" add column "gate_bow" jsonb null, add column "gate_warp" jsonb null`);
  }

  override down(): void {
    this.addSql(`alter table "flow" drop column "gate_warp", drop column "gate_bow", drop column "wafer_kind"`);
    this.addSql(`alter table "flow_step" drop column "handling"`);
  }
}
