import { z } from "zod";
import { checkFilmCut, filmCutFields, linesOf } from "./film-cut.ts";
import { measured, optionalMeasured } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

const layer = z
  .object({
    side: z.enum(["front", "back"]),
    film: z.uuid("Choose a film."),
    thickness: measured({ ...RULES.filmThickness, source: "assumed" }).refine(
      ({ value, tolerance }) => (tolerance ?? 0) < value,
      { path: ["tolerance"], error: "The tolerance is as large as the film itself." },
    ),
    stress: optionalMeasured({ ...RULES.stress, source: "assumed" }),
    ...filmCutFields,
  })
  .superRefine((typed, context) => {
    const fail = (path: string[], message: string) => context.addIssue({ code: "custom", path, message });
    checkFilmCut(typed, fail);
    if (typed.cut === undefined && typed.coverage === null)
      fail(["coverage"], `Type the ${RULES.coverage.label}. Blank is missing, not zero.`);
  })
  .transform(({ cut, coverage, lineWidth, lineDirection, ...film }) => ({
    ...film,
    coverage: coverage ?? 1,
    lines: linesOf({ cut, lineWidth, lineDirection }),
  }));

/** Films are listed top to bottom as the cut shows them, device side up. */
export const stackSchema = z.object({
  ...recordFields,
  program: z.uuid("Choose a program."),
  silicon: z.uuid("Choose the silicon."),
  siliconThickness: measured({ ...RULES.siliconThickness, source: "assumed" }).refine(
    ({ value, tolerance }) => (tolerance ?? 0) < value,
    { path: ["tolerance"], error: "The tolerance is as large as the silicon itself." },
  ),
  layers: z.array(layer).max(60, "A stack holds at most 60 films."),
});
export type StackValues = z.output<typeof stackSchema>;
