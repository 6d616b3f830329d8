import { z } from "zod";
import { DEFAULT_PREFERENCES, DENSITIES, THEMES, type Preferences } from "#app/lib/preferences.ts";

const { theme, density, singleKeys } = DEFAULT_PREFERENCES;

/** Preferences as they are stored; what a later version has taken away falls back to what is delivered. */
export const preferencesSchema: z.ZodType<Preferences> = z.object({
  theme: z.enum(THEMES).catch(theme),
  density: z.enum(DENSITIES).catch(density),
  singleKeys: z.boolean().catch(singleKeys),
});

/** The same from a form, where a box that is not ticked is not sent. */
export const preferencesFormSchema = z.object({
  theme: z.enum(THEMES, "Choose one of the themes."),
  density: z.enum(DENSITIES, "Choose one of the densities."),
  singleKeys: z.literal("on").optional(),
});
