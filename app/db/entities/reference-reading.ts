import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { ImportProfile } from "./import-profile.ts";
import { Person } from "./person.ts";
import { ReferenceWafer } from "./reference-wafer.ts";

/** A wafer of known bow, read on an instrument. */
export const ReferenceReading = defineEntity({
  name: "ReferenceReading",
  tableName: "reference_reading",
  properties: {
    id: p.uuid().primary(),
    /** null once the instrument's record is gone; its name stays */
    profile: () => p.manyToOne(ImportProfile).nullable().index(),
    instrument: p.text(),
    wafer: () => p.manyToOne(ReferenceWafer),
    /** ISO date */
    measuredOn: p.date(),
    /** standard bow as read, m */
    bow: p.double().$type<number>(),
    note: p.text(),
    /** why it does not count; null while it does */
    setAside: p.text().nullable(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type ReferenceReading = InferEntity<typeof ReferenceReading>;
