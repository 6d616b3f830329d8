import { z } from "zod";

/** Lots that are typed or come as a table. */
export const newLotForm = z.object({
  program: z.uuid("Choose the program that they are of."),
  name: z.string().trim().max(80, "Keep the name under 80 characters.").default(""),
  wafers: z.string().max(100_000, "That is too long for a table of wafers. Send it as a file.").default(""),
});
export type NewLotForm = z.output<typeof newLotForm>;
