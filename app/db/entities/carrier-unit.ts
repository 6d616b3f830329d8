import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import type { CarrierUnitState } from "#app/lib/carrier-units.ts";
import { Carrier } from "./carrier.ts";
import { recordProperties } from "./record.ts";

/** One piece of a kind of carrier, told from the others by its mark. */
export const CarrierUnit = defineEntity({
  name: "CarrierUnit",
  tableName: "carrier_unit",
  properties: {
    id: p.uuid().primary(),
    carrier: () => p.manyToOne(Carrier),
    /** serial or laser mark */
    mark: p.text(),
    /** times that it has been bonded */
    uses: p.integer(),
    state: p.text().$type<CarrierUnitState>(),
    /** ISO date; null until a use is counted here */
    lastUsedOn: p.date().nullable(),
    /** as measured on this piece; null until it is, and that of its kind counts */
    thicknessVariation: p.json<Measured>().nullable(),
    ...recordProperties,
  },
  uniques: [{ properties: ["carrier", "mark"] }],
});
export type CarrierUnit = InferEntity<typeof CarrierUnit>;
