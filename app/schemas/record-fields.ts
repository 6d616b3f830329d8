import { z } from "zod";

/** A line of text that may be left blank. */
export const line = (most: number) =>
  z
    .string()
    .trim()
    .max(most, `Keep it under ${most} characters.`)
    .optional()
    .transform((text) => text ?? "");

/** Fields that every record's form shares. */
export const recordFields = {
  name: z.string("Give it a name.").trim().min(1, "Give it a name.").max(120, "Keep the name under 120 characters."),
  note: line(1000),
};

/** A box to tick; one that is not ticked is not sent at all. */
export const checkbox = z
  .boolean()
  .optional()
  .transform((checked) => checked ?? false);

/** A choice that may be left open, as null. */
export const optionalChoice = <Word extends string>(words: readonly Word[]) =>
  z
    .union([z.enum(words as [Word, ...Word[]]), z.literal("")], "Choose one of the list.")
    .optional()
    .transform((word): Word | null => word || null);

/** Yes, no, or not given, as null: a box to tick could not tell the last two apart. */
export const yesOrNo = optionalChoice(["yes", "no"]).transform((word) => (word === null ? null : word === "yes"));

/** A whole number from `least` to `most`; `message` says what to type instead of anything else. */
export const wholeNumber = (message: string, { least, most }: { least: number; most: number }) =>
  z.number(message).int(message).min(least, `It must be ${least} or more.`).max(most, `It must be ${most} or less.`);
