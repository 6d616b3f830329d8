import { defineEntity, p } from "@mikro-orm/core";

/** Requests that a caller of the API has made within the minute that runs. Written by rate-limiter-flexible, whose columns these are. */
export const ApiRate = defineEntity({
  name: "ApiRate",
  tableName: "api_rate",
  properties: {
    key: p.string().length(255).primary(),
    points: p.integer().default(0),
    expire: p.bigint().nullable(),
  },
});
