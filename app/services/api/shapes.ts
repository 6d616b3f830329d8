import { z } from "zod";
import type { Measured } from "#app/engine/measured.ts";
import { SOURCE_KINDS } from "#app/engine/vocabulary.ts";

/** Shapes that several operations share. Numbers are SI; the unit is in the name. */

export const moment = z.iso.datetime().describe("UTC");
export const id = z.uuid();
export const named = z.object({ id, name: z.string() });
/** Silicon that a stack or a flow is on. */
export const siliconUsed = z.object({
  ...named.shape,
  diameter_m: z.number(),
  orientation: z.enum(["100", "111"]),
});
export const siliconJson = (silicon: {
  id: string;
  name: string;
  diameter: number;
  orientation: "100" | "111";
}): z.input<typeof siliconUsed> => ({
  id: silicon.id,
  name: silicon.name,
  diameter_m: silicon.diameter,
  orientation: silicon.orientation,
});
export const programSlug = z.string().describe("Short name of the program, such as tern.");
export const programQuery = { program: z.string().max(80).optional().describe("Short name of a program.") };

/** The schema of a stated value whose unit is `unit`. */
export const statedIn = (unit: string) =>
  z
    .object({
      value: z.number(),
      tolerance: z
        .number()
        .nullable()
        .describe("Half-width of the interval believed to hold it; null when nobody gave one."),
      source: z.enum(SOURCE_KINDS),
    })
    .describe(`In ${unit}.`);

export const stated = ({ value, tolerance, source }: Measured) => ({ value, tolerance, source });
export const statedOrNull = (measured: Measured | null | undefined) => (measured ? stated(measured) : null);

/** The parameter of an address that names a record. */
export const idParam = <Name extends string>(name: Name) =>
  z.object({ [name]: z.string() } as Record<Name, z.ZodString>);
