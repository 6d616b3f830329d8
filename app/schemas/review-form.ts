import { z } from "zod";
import { proofFields } from "./proof.ts";
import { lastDay, words, YEAR } from "./written.ts";

const STEP = "Choose a step of the flow.";

/** The last day on which a deviation counts. */
const end = lastDay("Type the last day as 2026-12-31.").refine(
  (day) => day.getTime() < Date.now() + YEAR,
  "A deviation lasts a year at most.",
);

/** Everything that is said or done on the page of a review, told apart by `intent`. */
export const reviewFormSchema = z.discriminatedUnion("intent", [
  z.object({
    intent: z.literal("ask"),
    note: z.string().trim().max(1000, "Keep it under 1000 characters.").default(""),
  }),
  z.object({
    intent: z.literal("comment"),
    step: z
      .union([z.literal(""), z.string().regex(/^\d{1,3}$/, STEP)], STEP)
      .default("")
      .transform((text) => (text === "" ? null : Number(text))),
    text: words("Write the comment.", 1000),
  }),
  z.object({
    intent: z.literal("deviate"),
    findings: z
      .array(z.string().regex(/^\d+:\d+(:\d+)?$/), "Tick the findings that it is for.")
      .min(1, "Tick the findings that it is for."),
    reason: words("Say why it is run all the same.", 1000),
    scope: words("Say which lots, wafers or tools it is for.", 300),
    until: end,
  }),
  z.object({ intent: z.literal("sign"), deviation: z.uuid("Open the page again.") }),
  z.object({ intent: z.literal("return"), reason: words("Say why it goes back.", 1000) }),
  z.object({
    intent: z.literal("release"),
    assumptions: z.literal("checked", "Tick that you have been through the assumptions."),
    remark: z.string().trim().max(1000, "Keep it under 1000 characters.").default(""),
    ...proofFields,
  }),
]);
export type ReviewForm = z.output<typeof reviewFormSchema>;

export const withdrawSchema = z.object({
  intent: z.literal("withdraw"),
  reason: words("Say why it must not be used any more.", 1000),
});
