import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { ImportProfile as Profile } from "#app/schemas/import-profile.ts";
import { recordProperties } from "./record.ts";

/** How one instrument of the site writes its files, as a person has confirmed it. */
export const ImportProfile = defineEntity({
  name: "ImportProfile",
  tableName: "import_profile",
  properties: {
    id: p.uuid().primary(),
    /** the instrument, as the site calls it */
    name: p.text().unique(),
    profile: p.json<Profile>(),
    ...recordProperties,
  },
});
export type ImportProfile = InferEntity<typeof ImportProfile>;
