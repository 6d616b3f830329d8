import { defineEntity, p } from "@mikro-orm/core";

/** Counts of attempts, shared by all web processes. The package that counts writes it by itself; keys hold hashes, no names. */
export const RateLimit = defineEntity({
  name: "RateLimit",
  tableName: "rate_limit",
  properties: {
    key: p.text().primary(),
    points: p.integer(),
    /** ms since 1970 */
    expire: p.bigint().nullable(),
  },
});
