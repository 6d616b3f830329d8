import { z } from "zod";
import { readWafers } from "#app/lib/lot-wafers.ts";
import type { LotWafer } from "./lot.ts";
import { measuredDay } from "./accept-form.ts";
import { optionalQuantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { line, optionalChoice } from "./record-fields.ts";

/** Faults of a list that are said one by one. */
const SAID = 8;

const wafers = z
  .string()
  .max(20_000, "That is too long for a list of wafers.")
  .optional()
  .transform((text, context): LotWafer[] => {
    if (!text?.trim()) return [];
    const list = readWafers(text, { bow: RULES.bow.range, thickness: RULES.siliconThickness.range });
    for (const message of list.faults.slice(0, SAID)) context.addIssue({ code: "custom", message });
    return list.wafers;
  });

/** Reading and lot of a summary, as its choice names them. */
const SUMMARY = /^([0-9a-f-]{36})\/([0-9a-f-]{36})?$/;

/** What such a form says, SI; `uncertainty` is the expanded one, k = 2. The day is there unless a summary may give it. */
export interface StepMeasurementValues {
  step: number;
  /** null for a list that is typed */
  summary: { reading: string; lot: string | null } | null;
  lot: string;
  wafers: LotWafer[];
  uncertainty: number | null;
  measuredAt: Date | null;
  instrument: string;
  sideUp: "device" | "back" | null;
  gravity: "compensated" | "included" | null;
}

/** Bows measured after a step: a lot's summary, or a list that is typed, with how they were measured. */
export const stepMeasurementSchema = z
  .object({
    step: z
      .string("Choose the step after which they were measured.")
      .regex(/^\d{1,3}$/, "Choose the step after which they were measured.")
      .transform(Number),
    summary: z.union([z.string().regex(SUMMARY, "Choose a summary of the list."), z.literal("")]).optional(),
    lot: line(80),
    wafers,
    uncertainty: optionalQuantity({
      label: "uncertainty",
      dimension: "length",
      range: { least: 1e-9, most: 1e-3, words: "1 nm to 1 mm" },
    }),
    measuredAt: z.union([z.literal("").transform(() => null), measuredDay]).optional(),
    instrument: line(80),
    sideUp: optionalChoice(["device", "back"]),
    gravity: optionalChoice(["compensated", "included"]),
  })
  .transform((form, context): StepMeasurementValues => {
    const refuse = (field: string, message: string) => {
      context.addIssue({ code: "custom", path: [field], message });
      return z.NEVER;
    };
    const { summary, measuredAt, ...rest } = form;
    const [, reading = "", lot = null] = SUMMARY.exec(summary ?? "") ?? [];
    if (reading) {
      if (form.wafers.length > 0)
        return refuse("wafers", "Clear the list, or choose no summary: it is one or the other.");
      return { ...rest, measuredAt: measuredAt ?? null, summary: { reading, lot } };
    }
    if (form.wafers.length === 0) return refuse("wafers", "List the wafers, or choose a summary.");
    if (!form.lot) return refuse("lot", "Name the lot, as it stands on its box.");
    if (!measuredAt) return refuse("measuredAt", "Type the day of the measurement as 2026-12-01.");
    return { ...rest, measuredAt, summary: null };
  });
