import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { ReleaseMethod } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { BondingMaterialHandlingValues } from "#app/schemas/library-handling.ts";
import { recordProperties } from "./record.ts";

/** A temporary bonding material with the way it lets go. */
export const BondingMaterial = defineEntity({
  name: "BondingMaterial",
  tableName: "bonding_material",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    note: p.text(),
    /** locked-in modulus that couples the pair, calibrated on measured pairs, Pa */
    effectiveModulus: p.json<Measured>(),
    dataSheetModulus: p.json<Measured>().nullable(),
    poissonsRatio: p.json<Measured>(),
    expansionBelow: p.json<Measured>(),
    expansionAbove: p.json<Measured>(),
    /** glass transition or softening point, K; null when there is none in the range used */
    softening: p.json<Measured>().nullable(),
    /** K; where it turns to a rubber, when that is known apart from its softening point */
    glassTransition: p.json<Measured>().nullable(),
    /** true for a thermoplastic, which flows above its softening point */
    flows: p.boolean(),
    /** K; of a thermoplastic: from here on the plates slide. null when nobody knows: they are taken not to */
    flowPoint: p.json<Measured>().nullable(),
    bondTemperature: p.json<Measured>(),
    temperatureLimit: p.json<Measured>(),
    /** m */
    leastThickness: p.double().$type<number>(),
    mostThickness: p.double().$type<number>(),
    thicknessVariationShare: p.json<Measured>(),
    release: p.text().$type<ReleaseMethod>(),
    releaseTemperature: p.json<Measured>(),
    thermalCycles: p.integer().nullable(),
    vacuum: p.text(),
    solvent: p.text(),
    acid: p.text(),
    base: p.text(),
    /** what only the handling rules ask */
    handling: p.json<BondingMaterialHandlingValues>(),
    ...recordProperties,
  },
});
export type BondingMaterial = InferEntity<typeof BondingMaterial>;
