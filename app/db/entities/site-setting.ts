import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Paper } from "#app/lib/paper-size.ts";
import type { Role } from "#app/policies/roles.ts";
import { recordProperties } from "./record.ts";

/** What holds for the whole site. There is one row, from the first migration of the table on; nobody adds or deletes any. */
export const SiteSetting = defineEntity({
  name: "SiteSetting",
  tableName: "site_setting",
  properties: {
    id: p.uuid().primary(),
    /** what sheets and other pages are printed on unless their address says otherwise */
    paper: p.text().$type<Paper>(),
    /** roles whose holders sign in with a one-time code as well */
    codesFor: p.array().$type<Role[]>(),
    ...recordProperties,
  },
});
export type SiteSetting = InferEntity<typeof SiteSetting>;
