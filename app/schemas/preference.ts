import { z } from "zod";
import { LENGTH_UNITS, STRESS_UNITS, TEMPERATURE_UNITS } from "#app/lib/own-units.ts";
import { DECIMAL_MARKS, DEFAULT_PREFERENCES, DENSITIES, THEMES, type Preferences } from "#app/lib/preferences.ts";

const delivered = DEFAULT_PREFERENCES;

/** Preferences as they are stored; what a later version has taken away, or an earlier one lacked, falls back to what is delivered. */
export const preferencesSchema: z.ZodType<Preferences> = z.object({
  theme: z.enum(THEMES).catch(delivered.theme),
  density: z.enum(DENSITIES).catch(delivered.density),
  singleKeys: z.boolean().catch(delivered.singleKeys),
  length: z.enum(LENGTH_UNITS).catch(delivered.length),
  stress: z.enum(STRESS_UNITS).catch(delivered.stress),
  temperature: z.enum(TEMPERATURE_UNITS).catch(delivered.temperature),
  decimalMark: z.enum(DECIMAL_MARKS).catch(delivered.decimalMark),
});

/** The same from a form, where a box that is not ticked is not sent. What a form does not ask stays as it was. */
export const preferencesFormSchema = z.object({
  theme: z.enum(THEMES, "Choose one of the themes."),
  density: z.enum(DENSITIES, "Choose one of the densities."),
  singleKeys: z
    .literal("on")
    .optional()
    .transform((ticked) => ticked === "on"),
  length: z.enum(LENGTH_UNITS, "Choose one of the units of length.").optional(),
  stress: z.enum(STRESS_UNITS, "Choose one of the units of stress.").optional(),
  temperature: z.enum(TEMPERATURE_UNITS, "Choose one of the units of temperature.").optional(),
  decimalMark: z.enum(DECIMAL_MARKS, "Choose one of the decimal marks.").optional(),
});
