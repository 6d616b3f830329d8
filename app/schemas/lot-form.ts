import { z } from "zod";
import { readWafers } from "#app/lib/lot-wafers.ts";
import type { LotInput, LotWafer } from "./lot.ts";
import { optionalQuantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";

/** Faults of a list that are said one by one; more are counted. */
const SAID = 12;

const wafers = z
  .string()
  .max(20_000, "That is too long for a list of wafers.")
  .optional()
  .transform((text, context): LotWafer[] => {
    if (!text?.trim()) return [];
    const list = readWafers(text, { bow: RULES.bow.range, thickness: RULES.siliconThickness.range });
    const more = list.faults.length - SAID;
    const said = more > 0 ? [...list.faults.slice(0, SAID), `And ${more} more.`] : list.faults;
    for (const message of said) context.addIssue({ code: "custom", message });
    return list.wafers;
  });

const answer = <Word extends string>(words: readonly [Word, ...Word[]]) =>
  z
    .union([z.enum(words), z.literal("")], "Choose from the list.")
    .optional()
    .transform((word) => word || null);

const meanOf = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

/** A lot's own figures: its mean bow, or its wafers one by one, which have a mean. */
export const lotSchema = z
  .object({
    name: z
      .string("Name the lot, as it stands on its box.")
      .trim()
      .min(1, "Name the lot, as it stands on its box.")
      .max(40, "Keep the name under 40 characters.")
      .regex(/^\P{Cc}*$/u, "The name holds a character that cannot be shown. Type it anew."),
    bow: optionalQuantity(RULES.bow),
    thickness: optionalQuantity(RULES.siliconThickness),
    warp: optionalQuantity(RULES.warp),
    edgeChips: answer(["none", "found"]),
    identity: answer(["matches", "differs"]),
    wafers,
  })
  .transform((lot, context): LotInput => {
    const refuse = (field: string, message: string) => {
      context.addIssue({ code: "custom", path: [field], message });
      return z.NEVER;
    };
    if (lot.wafers.length === 0) {
      if (lot.bow === null) return refuse("bow", "Type the mean bow, or list the wafers. Blank is missing, not zero.");
      return { ...lot, bow: lot.bow };
    }
    if (lot.bow !== null)
      return refuse("bow", "The wafers listed have a mean of their own. Leave this blank, or clear the list.");
    const thicknesses = lot.wafers.flatMap(({ thickness }) => thickness ?? []);
    if (thicknesses.length > 0 && lot.thickness !== null)
      return refuse(
        "thickness",
        "The wafers listed have a thickness of their own. Leave this blank, or clear the list.",
      );
    return {
      ...lot,
      bow: meanOf(lot.wafers.map(({ bow }) => bow)),
      thickness: thicknesses.length > 0 ? meanOf(thicknesses) : lot.thickness,
    };
  });
