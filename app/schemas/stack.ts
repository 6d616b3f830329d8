import { z } from "zod";
import { measured, optionalMeasured, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

const layer = z.object({
  side: z.enum(["front", "back"]),
  film: z.uuid("Choose a film."),
  thickness: measured({ ...RULES.filmThickness, source: "assumed" }),
  stress: optionalMeasured({ ...RULES.stress, source: "assumed" }),
  coverage: quantity(RULES.coverage),
});

export const stackSchema = z.object({
  ...recordFields,
  program: z.uuid("Choose a program."),
  silicon: z.uuid("Choose the silicon."),
  siliconThickness: measured({ ...RULES.siliconThickness, source: "assumed" }),
  layers: z.array(layer).max(60, "A stack holds at most 60 films."),
});
export type StackValues = z.output<typeof stackSchema>;
export type StackFormValues = z.input<typeof stackSchema>;
