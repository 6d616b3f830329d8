import { z } from "zod";
import { checkbox, line } from "./record-fields.ts";

/** Why something is done, for whoever asks later. */
export const reason = (message: string) =>
  z.string(message).trim().min(1, message).max(300, "Keep the reason under 300 characters.");

/** The first day that a measurement may be of; an earlier one is a slip of the keyboard. */
const EARLIEST = "1990-01-01";

/** A day of a measurement, at noon UTC, so that it is the same day in every zone that has a fab. */
export const measuredDay = z
  .string("Type the day of the measurement as 2026-12-01.")
  .trim()
  .pipe(z.iso.date("Type the day of the measurement as 2026-12-01."))
  .refine((day) => day >= EARLIEST, "A day before 1990 is none of a measurement here.")
  .refine((day) => new Date(day).getTime() <= Date.now(), "That day is still to come.")
  .transform((day) => new Date(`${day}T12:00:00Z`));

/** What a person says when they accept a scan into its film's history. */
export const acceptSchema = z.object({
  reason: reason("Say why this value may stand for the film."),
  instrument: line(80),
  measuredAt: measuredDay,
  use: checkbox,
});
export type AcceptValues = z.output<typeof acceptSchema>;
