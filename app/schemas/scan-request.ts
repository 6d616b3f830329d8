import { z } from "zod";
import { importProfileSchema } from "./import-profile.ts";

/** What the API is told beside the file. The fields are those of a form, so all of them are text. */
export const scanRequestSchema = z.object({
  program: z.string("Name the program, for example tern.").trim().min(1, "Name the program, for example tern."),
  edge_exclusion_m: z
    .string()
    .trim()
    .regex(/^\d+(\.\d+)?([eE][+-]?\d+)?$/, "Give a number of metres, for example 0.005.")
    .transform(Number)
    .pipe(z.number().max(0.2, "At most 0.2 m can be left out."))
    .default(0),
  import_profile: z
    .string()
    .trim()
    .transform((text, context) => {
      try {
        return JSON.parse(text) as unknown;
      } catch {
        context.addIssue({ code: "custom", message: "Give an import profile as JSON." });
        return z.NEVER;
      }
    })
    .pipe(importProfileSchema)
    .optional(),
  import_profile_id: z.uuid("Give the id of an import profile.").optional(),
});
