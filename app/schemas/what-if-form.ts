import { z } from "zod";
import { HOLDINGS } from "#app/engine/vocabulary.ts";
import { RULES } from "./ranges.ts";
import type { WhatIfChange } from "./what-if.ts";

const within = ({ range }: (typeof RULES)[keyof typeof RULES]) => z.number().min(range.least).max(range.most);
const where = { step: z.uuid() };
const film = z.number().int().min(0).max(19);
const none = z.null();

const change = z.discriminatedUnion("field", [
  z.object({ ...where, film: none, field: z.literal("siliconAfter"), value: within(RULES.siliconThickness) }),
  z.object({ ...where, film: none, field: z.literal("peakTemperature"), value: within(RULES.temperature) }),
  z.object({ ...where, film, field: z.literal("filmThickness"), value: within(RULES.filmThickness) }),
  z.object({ ...where, film, field: z.literal("filmStress"), value: within(RULES.stress) }),
  z.object({ ...where, film: none, field: z.literal("planned"), value: z.enum(HOLDINGS) }),
  z.object({ ...where, film: none, field: z.literal("carrier"), value: z.uuid() }),
  z.object({ ...where, film: none, field: z.literal("bondingMaterial"), value: z.uuid() }),
]);

const changes = z.array(change).min(1).max(40);

/** The changes that a what-if posts; null for anything that no page of ours sends. */
export function readWhatIf(posted: FormDataEntryValue | null): WhatIfChange[] | null {
  if (typeof posted !== "string") return null;
  try {
    const read = changes.safeParse(JSON.parse(posted));
    return read.success ? read.data : null;
  } catch {
    return null;
  }
}
