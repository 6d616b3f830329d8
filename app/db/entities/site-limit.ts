import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { LimitKey } from "#app/engine/rules/limits.ts";
import { recordProperties } from "./record.ts";

/** One threshold of the handling rules as this site has set it, SI. */
export const SiteLimit = defineEntity({
  name: "SiteLimit",
  tableName: "site_limit",
  properties: {
    id: p.uuid().primary(),
    key: p.text().$type<LimitKey>().unique(),
    value: p.double().$type<number>(),
    source: p.text(),
    ...recordProperties,
  },
});
export type SiteLimit = InferEntity<typeof SiteLimit>;
