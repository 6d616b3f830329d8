import { z } from "zod";

/** Puts a lot on a revision of a sheet, or moves it to another one. */
export const assignForm = z.object({
  intent: z.literal("assign"),
  revision: z.uuid("Choose the revision that the lot is to be worked by."),
  fromStep: z
    .string("Type the number of the step at which the lot goes on.")
    .trim()
    .regex(/^[1-9]\d{0,2}$/, "Type the number of the step at which the lot goes on, such as 1.")
    .transform(Number),
  reason: z.string().trim().max(1000, "Keep it under 1000 characters.").default(""),
});
export type AssignForm = z.output<typeof assignForm>;
