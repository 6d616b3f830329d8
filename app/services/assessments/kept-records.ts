import type { InputRecord } from "#app/schemas/assessment-changes.ts";

/** Where a record that an input comes from is kept, and the column that an input names it by. */
export const KEPT_RECORDS = {
  film: ["film", "id"],
  carrier: ["carrier", "id"],
  bondingMaterial: ["bonding_material", "id"],
  tape: ["tape", "id"],
  equipment: ["equipment", "id"],
  limit: ["site_limit", "key"],
} as const satisfies Record<Exclude<InputRecord, "flow">, readonly [string, string]>;

export const KEPT_KINDS = Object.keys(KEPT_RECORDS) as (keyof typeof KEPT_RECORDS)[];
