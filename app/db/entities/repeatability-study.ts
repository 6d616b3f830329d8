import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { StudyReading, StudyResult } from "#app/schemas/instrument.ts";
import { ImportProfile } from "./import-profile.ts";
import { Person } from "./person.ts";

/** One wafer measured again and again on an instrument, taken off and put back between. Holds figures only, so it is the site's. */
export const RepeatabilityStudy = defineEntity({
  name: "RepeatabilityStudy",
  tableName: "repeatability_study",
  properties: {
    id: p.uuid().primary(),
    /** null once the instrument's record is gone; its name stays */
    profile: () => p.manyToOne(ImportProfile).nullable().index(),
    instrument: p.text(),
    wafer: p.text(),
    /** m */
    diameter: p.double().$type<number>(),
    readings: p.json<StudyReading[]>(),
    result: p.json<StudyResult>(),
    note: p.text(),
    /** why it does not count; null while it does */
    setAside: p.text().nullable(),
    engineVersion: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type RepeatabilityStudy = InferEntity<typeof RepeatabilityStudy>;
