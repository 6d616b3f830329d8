import { z } from "zod";
import { SOURCE_KINDS } from "#app/engine/vocabulary.ts";
import { readExpansionRows, type ExpansionRecord } from "#app/lib/expansion-rows.ts";
import { optionalQuantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { line } from "./record-fields.ts";

const LONGEST = 10_000;

/** A curve of expansion that may be left blank: rows of temperature and coefficient, with what holds for the whole of it. */
export const optionalExpansionCurve = z
  .object({
    rows: z
      .string()
      .max(LONGEST, `Keep the curve under ${LONGEST} characters.`)
      .optional()
      .transform((text) => text ?? ""),
    tolerance: optionalQuantity({
      label: "tolerance",
      dimension: "expansion",
      range: { least: 0, most: RULES.expansion.range.most, words: "zero to 1000 ppm/K" },
    }),
    source: z.union([z.enum(SOURCE_KINDS), z.literal("")], "Say where the curve comes from.").optional(),
    note: line(300),
    on: z.union([z.iso.date("Type the date as 2026-12-01."), z.literal("")]).optional(),
  })
  .transform(({ rows, tolerance, source, note, on }, context): ExpansionRecord | null => {
    const fail = (path: string, message: string) => {
      context.addIssue({ code: "custom", path: [path], message });
      return z.NEVER;
    };
    const read = readExpansionRows(rows);
    if (!read.ok) {
      const beside = tolerance !== null || note !== "";
      if (read.blank) return beside ? fail("rows", "Type the curve as well, or clear its tolerance and note.") : null;
      return fail("rows", read.message);
    }
    if (!source) return fail("source", "Say where the curve comes from.");
    return { ...read.points, tolerance, source, note, on: on || null };
  })
  .optional()
  .transform((curve) => curve ?? null);
