import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { CarrierMaterial } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { ExpansionRecord } from "#app/lib/expansion-rows.ts";
import type { CarrierHandlingValues } from "#app/schemas/library-handling.ts";
import { recordProperties } from "./record.ts";

/** A kind of carrier wafer. */
export const Carrier = defineEntity({
  name: "Carrier",
  tableName: "carrier",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    material: p.text().$type<CarrierMaterial>(),
    note: p.text(),
    /** m */
    diameter: p.double().$type<number>(),
    thickness: p.json<Measured>(),
    youngsModulus: p.json<Measured>(),
    poissonsRatio: p.json<Measured>(),
    /** mean over `expansionRange`; null means the curve below, else silicon's own */
    expansion: p.json<Measured>().nullable(),
    expansionRange: p.text(),
    /** temperatures between which `expansion` is that mean, K; null when nobody said */
    meanExpansionFrom: p.double().$type<number>().nullable(),
    meanExpansionTo: p.double().$type<number>().nullable(),
    /** expansion over temperature; with it `expansion` only moves the whole curve */
    expansionCurve: p.json<ExpansionRecord>().nullable(),
    density: p.json<Measured>(),
    thicknessVariation: p.json<Measured>(),
    temperatureLimit: p.json<Measured>(),
    passesUltraviolet: p.boolean(),
    passesInfrared: p.boolean(),
    perforated: p.boolean(),
    reuseLimit: p.integer(),
    /** what only the handling rules ask */
    handling: p.json<CarrierHandlingValues>(),
    ...recordProperties,
  },
});
export type Carrier = InferEntity<typeof Carrier>;
