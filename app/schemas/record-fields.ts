import { z } from "zod";

/** Fields that every record's form shares. */
export const recordFields = {
  name: z.string("Give it a name.").trim().min(1, "Give it a name.").max(120, "Keep the name under 120 characters."),
  note: z
    .string()
    .trim()
    .max(1000, "Keep the note under 1000 characters.")
    .optional()
    .transform((text) => text ?? ""),
};

/** The version that a form was filled from; missing for a new record. */
export const versionField = z.coerce.number().int().optional();

/** A whole number that may be missing. */
export const optionalCount = (most: number) =>
  z.number("Type a whole number.").int("Type a whole number.").min(0).max(most).optional();
