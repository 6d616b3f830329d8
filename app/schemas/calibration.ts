import { z } from "zod";
import { FIT_NAMES } from "#app/lib/calibration-view.ts";
import { optionalQuantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";

const MOST_ROWS = 30;

/** A row of the form: null when it is blank altogether, else all three of it. */
const row = z
  .object({
    step: z
      .string()
      .regex(/^\d{1,4}$/, "Choose one of the list.")
      .optional(),
    bow: optionalQuantity({ ...RULES.bow, label: "measured bow" }),
    uncertainty: optionalQuantity(RULES.bowUncertainty),
  })
  .optional()
  .transform((typed, context) => {
    const { step, bow = null, uncertainty = null } = typed ?? {};
    if (!step && bow === null && uncertainty === null) return null;
    const fail = (field: string, message: string) => context.addIssue({ code: "custom", path: [field], message });
    if (!step) fail("step", "Choose the step after which it was measured.");
    if (bow === null) fail("bow", "Type the measured bow. Blank is missing, not zero.");
    if (uncertainty === null) fail("uncertainty", "Type how well it is known: its standard uncertainty.");
    return step && bow !== null && uncertainty !== null
      ? { step: Number(step), bow, standardUncertainty: uncertainty }
      : z.NEVER;
  });

/** A measured bow of a pair as its row gives it; `row` is its place in the form, from 0. Standard bow, SI. */
export interface MeasuredBow {
  row: number;
  step: number;
  bow: number;
  standardUncertainty: number;
}

/** Measured bows of pairs that went through one flow. Rows that are blank altogether are passed over. */
export const calibrationSchema = z
  .object({
    flow: z.uuid("Choose the flow that the pairs have been through."),
    fit: z.enum(FIT_NAMES, "Choose what is to be fitted."),
    rows: z
      .array(row)
      .max(MOST_ROWS, `At most ${MOST_ROWS} bows at a time.`)
      .optional()
      .transform((rows) => rows ?? []),
  })
  .transform(({ rows, ...rest }, context) => {
    const bows = rows.flatMap((typed, index): MeasuredBow[] => (typed ? [{ row: index, ...typed }] : []));
    if (bows.length === 0)
      context.addIssue({
        code: "custom",
        path: ["rows", 0, "bow"],
        message: "Type at least one measured bow with its step and its standard uncertainty.",
      });
    return { ...rest, bows };
  });
export type CalibrationValues = z.output<typeof calibrationSchema>;
