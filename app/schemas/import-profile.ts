import { z } from "zod";
import {
  COLUMN_ROLES,
  DATE_ORDERS,
  DECIMAL_MARKS,
  ENCODINGS,
  FILE_KINDS,
  READ_UNITS,
  THOUSANDS,
} from "#app/lib/scan-reading/reading.ts";
import type { RecordStamp } from "./record-stamp.ts";

const column = z
  .strictObject({
    /** place from the left, from 0 */
    index: z.int().min(0).max(511).optional(),
    /** head of the column as the file has it */
    heading: z.string().trim().min(1).max(120).optional(),
    role: z.enum(COLUMN_ROLES),
    unit: z.enum(READ_UNITS).optional(),
  })
  .refine(
    ({ index, heading }) => index !== undefined || heading !== undefined,
    "Name the column by its place or its head.",
  );

/**
 * How an instrument writes its files: what a person has answered, kept for its next ones. It goes before what is told by a file;
 * what is left out is told by the file.
 */
export const importProfileSchema = z.strictObject({
  kind: z.enum(FILE_KINDS).optional(),
  encoding: z.enum(ENCODINGS).optional(),
  delimiter: z
    .string()
    .length(1, "A delimiter is one character.")
    .regex(/^[^\p{L}\p{N}"\r\n.+-]$/u, "That cannot stand between columns.")
    .optional(),
  decimalMark: z.enum(DECIMAL_MARKS).optional(),
  thousands: z.enum(THOUSANDS).optional(),
  /** counted from 1; null says that there is none */
  headerRow: z.int().min(1).max(10_000).nullable().optional(),
  /** first row of data, counted from 1 */
  firstRow: z.int().min(1).max(10_000).optional(),
  /** the columns that are read; others are left out */
  columns: z.array(column).min(1).max(512).optional(),
  /** units by what is measured, for files that do not name them */
  units: z.partialRecord(z.enum(COLUMN_ROLES), z.enum(READ_UNITS)).optional(),
  dateOrder: z.enum(DATE_ORDERS).optional(),
  /** how the figures of a summary were measured */
  measured: z
    .strictObject({
      sideUp: z.enum(["device", "back"]),
      support: z.enum(["three points", "ring", "table", "centre"]),
      gravity: z.enum(["compensated", "included"]),
    })
    .optional(),
  /** what lay under the wafer while its thickness was mapped */
  underneath: z.enum(["nothing", "tape", "carrier"]).optional(),
});
export type ImportProfile = z.output<typeof importProfileSchema>;

/** An import profile under the name of its instrument. */
export const importProfileRecordSchema = z.strictObject({
  name: z
    .string("Name the instrument.")
    .trim()
    .min(1, "Name the instrument.")
    .max(80, "Keep the name under 80 characters.")
    .regex(/^\P{Cc}*$/u, "The name holds a character that cannot be shown. Type it anew."),
  profile: importProfileSchema,
});
export type ImportProfileValues = z.output<typeof importProfileRecordSchema>;

/** An instrument's import profile, as a list shows it. */
export interface ImportProfileRow extends ImportProfileValues {
  id: string;
  stamp: RecordStamp;
}
