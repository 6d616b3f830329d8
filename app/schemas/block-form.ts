import { z } from "zod";
import { BLOCK_CAUSE_NAMES } from "#app/lib/floor/block-causes.ts";
import { words } from "./written.ts";

const reason = words("Say why, in a sentence.", 1000);
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
  words: words("Say what was done about it.", 1000),
});
export type ClearForm = z.output<typeof clearForm>;
