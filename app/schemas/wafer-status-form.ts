import { z } from "zod";
import { WAFER_STATUSES } from "#app/lib/wafer-status.ts";

/** Says where ticked wafers of a lot stand. */
export const waferStatusForm = z.object({
  intent: z.literal("status"),
  wafers: z.array(z.uuid("Open the page again.")).min(1, "Tick the wafers that it is about."),
  status: z.enum(WAFER_STATUSES, "Choose where they stand."),
});
export type WaferStatusForm = z.output<typeof waferStatusForm>;
