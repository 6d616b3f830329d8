import { z } from "zod";

/** Text that must say something. @param message what to do where it is missing */
export const words = (message: string, most: number) =>
  z.string(message).trim().min(1, message).max(most, `Keep it under ${most} characters.`);

/** A day as '2026-12-31'. */
const isoDay = (message: string) => z.string(message).trim().pipe(z.iso.date(message));

/** The beginning of a day that is typed, UTC. */
export const firstDay = (message: string) => isoDay(message).transform((day) => new Date(`${day}T00:00:00Z`));

/** The end of a day that is typed and not over yet, UTC. */
export const lastDay = (message: string) =>
  isoDay(message)
    .transform((day) => new Date(`${day}T23:59:59Z`))
    .refine((end) => end.getTime() > Date.now(), "That day is over. Type one that is still to come.");

/** Longest time that somebody can be given at once, ms. */
export const YEAR = 366 * 24 * 3600e3;
