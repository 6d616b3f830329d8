import { z } from "zod";
import { BLOCK_CAUSE_NAMES } from "#app/lib/floor/block-causes.ts";

const reason = z
  .string("Say why, in a sentence.")
  .trim()
  .min(1, "Say why, in a sentence.")
  .max(1000, "Keep it under 1000 characters.");
const cause = z.enum(BLOCK_CAUSE_NAMES, "Choose the cause: it says who may clear it.");
/** made before it is sent, so that it counts once */
const id = z.uuid("Open the page again.");

/** Holds a lot. */
export const holdForm = z.object({ intent: z.literal("hold"), id, cause, reason });
export type HoldForm = z.output<typeof holdForm>;

/** Stops a step for every lot. */
export const stopForm = z.object({
  intent: z.literal("stop"),
  id,
  revision: z.uuid("Open the page again."),
  leg: z
    .string()
    .regex(/^\d{1,2}$/)
    .default("0")
    .transform(Number),
  step: z
    .string("Open the page again.")
    .regex(/^\d{1,3}$/, "Open the page again.")
    .transform(Number),
  cause,
  reason,
});
export type StopForm = z.output<typeof stopForm>;

/** Clears a hold or a stop, with words. */
export const clearForm = z.object({
  intent: z.literal("clear"),
  block: z.uuid("Open the page again."),
  kind: z.enum(["hold", "stop"], "Open the page again."),
  words: z
    .string("Say what was done about it.")
    .trim()
    .min(1, "Say what was done about it.")
    .max(1000, "Keep it under 1000 characters."),
});
export type ClearForm = z.output<typeof clearForm>;
