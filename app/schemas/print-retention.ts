import { z } from "zod";

/** How many years a program can keep who printed its sheets; blank: for good. */
export const PRINT_YEARS = ["1", "2", "3", "5", "10"] as const;

/** How long each program keeps its prints, as the settings send it. */
export const printRetentionSchema = z.object({
  intent: z.literal("prints"),
  kept: z
    .array(
      z.object({
        program: z.uuid(),
        years: z
          .enum(PRINT_YEARS)
          .optional()
          .transform((years) => (years === undefined ? null : Number(years))),
      }),
    )
    .max(100),
});
export type PrintRetentionValues = z.output<typeof printRetentionSchema>["kept"];

/** A program and how many years it keeps who printed its sheets; null: for good. */
export interface PrintRetention {
  id: string;
  name: string;
  years: number | null;
}
