import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { PeakHolding } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { EquipmentHandlingValues } from "#app/schemas/library-handling.ts";
import { recordProperties } from "./record.ts";

/** A class of tool with the warp it takes. */
export const Equipment = defineEntity({
  name: "Equipment",
  tableName: "equipment",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    note: p.text(),
    /** how it holds the wafer when it is hot, in words */
    holding: p.text(),
    atPeak: p.text().$type<PeakHolding>(),
    warpLimitEdgesUp: p.json<Measured>().nullable(),
    warpLimitEdgesDown: p.json<Measured>().nullable(),
    leastUnsupportedThickness: p.json<Measured>().nullable(),
    largestDiameter: p.json<Measured>(),
    /** what only the handling rules ask */
    handling: p.json<EquipmentHandlingValues>(),
    ...recordProperties,
  },
});
export type Equipment = InferEntity<typeof Equipment>;
