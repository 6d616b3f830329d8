import { z } from "zod";
import type { Measured } from "#app/engine/measured.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { SOURCE_KINDS, type SourceKind } from "#app/engine/vocabulary.ts";
import { readQuantity, toleranceRule, type QuantityRule } from "#app/lib/read-quantity.ts";

/** What a form sends for a quantity: text with its unit. */
const text = z.string().trim().max(60, "That is too long for a quantity.").optional();

/** A quantity that must be given, as its SI value. */
export function quantity(rule: QuantityRule) {
  return text.transform((typed, context) => {
    const read = readQuantity(typed, rule);
    if (read.ok) return read.value;
    context.addIssue({ code: "custom", message: read.message });
    return z.NEVER;
  });
}

/** A quantity that may be left blank, as its SI value or null. */
export function optionalQuantity(rule: QuantityRule) {
  return text.transform((typed, context) => {
    const read = readQuantity(typed, rule);
    if (read.ok) return read.value;
    if (read.blank) return null;
    context.addIssue({ code: "custom", message: read.message });
    return z.NEVER;
  });
}

/** Text fields of a measured property. */
const measuredShape = z.object({
  value: text,
  tolerance: text,
  source: z.enum(SOURCE_KINDS, "Say where the value comes from.").optional(),
  note: z.string().trim().max(300, "Keep the note under 300 characters.").optional(),
  on: z.union([z.iso.date("Type the date as 2026-12-01."), z.literal("")]).optional(),
});

interface MeasuredRule extends QuantityRule {
  /** the tolerance's dimension when it differs: a temperature's tolerance is a difference */
  toleranceDimension?: Dimension;
  source?: SourceKind;
}

function toMeasured(
  fields: z.output<typeof measuredShape>,
  rule: MeasuredRule,
  context: z.core.$RefinementCtx,
): Measured | null {
  const value = readQuantity(fields.value, rule);
  const tolerance = readQuantity(fields.tolerance, toleranceRule(rule, rule.toleranceDimension));
  const fail = (field: string, message: string) => {
    context.addIssue({ code: "custom", path: [field], message });
    return null;
  };
  if (!tolerance.ok && !tolerance.blank) fail("tolerance", tolerance.message);
  if (!value.ok) return value.blank ? null : fail("value", value.message);
  const source = fields.source ?? rule.source;
  if (!source) return fail("source", "Say where the value comes from.");
  return {
    value: value.value,
    tolerance: tolerance.ok ? tolerance.value : null,
    source,
    note: fields.note ?? "",
    on: fields.on ? fields.on : null,
    text: fields.value ?? "",
  };
}

/** A property that must be given: value with tolerance, source and note. */
export function measured(rule: MeasuredRule) {
  return measuredShape.transform((fields, context): Measured => {
    const result = toMeasured(fields, rule, context);
    if (result) return result;
    if (!fields.value?.trim())
      context.addIssue({
        code: "custom",
        path: ["value"],
        message: `Type the ${rule.label}. Blank is missing, not zero.`,
      });
    return z.NEVER;
  });
}

/** A property that may be left blank, but not its value alone: what was typed beside it would be lost. */
export function optionalMeasured(rule: MeasuredRule) {
  return measuredShape
    .transform((fields, context): Measured | null => {
      const result = toMeasured(fields, rule, context);
      if (!fields.value?.trim() && (fields.tolerance?.trim() || fields.note))
        context.addIssue({
          code: "custom",
          path: ["value"],
          message: `Type the ${rule.label} as well, or clear its tolerance and note.`,
        });
      return result;
    })
    .optional()
    .transform((value) => value ?? null);
}
