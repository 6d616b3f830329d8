import { z } from "zod";
import { WAFER_SCAN_SIDES } from "./wafer.ts";

const name = (longest: number) =>
  z
    .string()
    .trim()
    .max(longest, `Keep the name under ${longest} characters.`)
    .regex(/^\P{Cc}*$/u, "The name holds a character that cannot be shown. Type it anew.")
    .default("");

/** A wafer as a person names it: by its name, or by its slot in a lot. */
export const placeShape = {
  wafer: name(60),
  lot: name(60),
  slot: z
    .string()
    .trim()
    .regex(/^(?:0*[1-9]|0*[1-4]\d|0*50)?$/, "A slot is a whole number from 1 to 50.")
    .default("")
    .transform((text) => (text === "" ? null : Number(text))),
};

/** Where a scan lies: on which wafer, along which line, before or after the film. */
export const waferPlaceSchema = z.object({
  ...placeShape,
  azimuth: z
    .string("Type the azimuth in degrees from the notch.")
    .trim()
    .transform((text) => text.replace(",", ".").replace(/\s*°$/, ""))
    .pipe(z.string().regex(/^\d+(?:\.\d+)?$/, "Type an angle of 0 to 360°."))
    .transform(Number)
    .pipe(z.number().max(360, "Type an angle of 0 to 360°."))
    .transform((degrees) => degrees * (Math.PI / 180)),
  side: z.enum(WAFER_SCAN_SIDES, "Say whether the file is before or after the film."),
});
export type WaferPlace = z.output<typeof waferPlaceSchema>;
