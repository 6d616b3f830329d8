import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";

/** The one-time codes of a person: the secret that their app shares, and what is left of their recovery codes. */
export const OneTimeCodes = defineEntity({
  name: "OneTimeCodes",
  tableName: "one_time_codes",
  properties: {
    id: p.uuid().primary(),
    person: () => p.oneToOne(Person).owner().unique(),
    /** encrypted with a key that is not in the database */
    secretSealed: p.text().hidden(),
    createdAt: p.datetime(),
    /** since when they are asked for: null until a first code has shown that the app has the secret */
    confirmedAt: p.datetime().nullable(),
    /** time step of the newest code that was taken: nothing up to it counts again (RFC 6238, 5.2) */
    lastStep: p.integer().nullable(),
    /** SHA-256 of the recovery codes that were not used yet; each has 120 random bits */
    recoveryHashes: p.array().hidden(),
    recoveryMadeAt: p.datetime().nullable(),
    /** when one of them was used last */
    recoveryUsedAt: p.datetime().nullable(),
  },
});
export type OneTimeCodes = InferEntity<typeof OneTimeCodes>;
