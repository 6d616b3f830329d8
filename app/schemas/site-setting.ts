import { z } from "zod";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";

/** What a site's page of settings sends, with the version that was looked at. */
export const siteSettingSchema = z.object({
  paper: z.enum(Object.keys(PAPERS) as Paper[], "Choose one of the papers."),
  version: z.coerce.number().int().positive(),
});
export type SiteSettingValues = z.infer<typeof siteSettingSchema>;
