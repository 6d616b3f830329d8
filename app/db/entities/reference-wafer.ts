import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";

/** A wafer whose bow is known, to hold instruments against. A new certificate makes a new one: readings keep what they were held to. */
export const ReferenceWafer = defineEntity({
  name: "ReferenceWafer",
  tableName: "reference_wafer",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    /** standard bow over its diameter, m */
    bow: p.double().$type<number>(),
    /** of the bow, standard uncertainty, m */
    bowUncertainty: p.double().$type<number>(),
    /** m */
    diameter: p.double().$type<number>(),
    note: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type ReferenceWafer = InferEntity<typeof ReferenceWafer>;
