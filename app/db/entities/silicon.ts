import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import { recordProperties } from "./record.ts";

/** A kind of wafer as it is bought. Its elastic data follow from the orientation. */
export const Silicon = defineEntity({
  name: "Silicon",
  tableName: "silicon",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    orientation: p.text().$type<"100" | "111">(),
    /** m */
    diameter: p.double().$type<number>(),
    thickness: p.json<Measured>(),
    note: p.text(),
    ...recordProperties,
  },
});
export type Silicon = InferEntity<typeof Silicon>;
