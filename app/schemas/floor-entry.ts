import { z } from "zod";
import { GRAVITY, MEASURED_ON, MEASURED_SIDES } from "#app/lib/floor/measured-how.ts";
import { optionalQuantity, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { words } from "./written.ts";

/** What somebody on the floor can say of a lot. */
export type FloorKind = "acknowledged" | "started" | "done" | "measured" | "observed";

const remark = z.string().trim().max(300, "Keep it under 300 characters.").default("");

/** A count of wafers, up to what lots have; null where nobody counted. */
const count = z
  .union([z.literal(""), z.string().regex(/^\d{1,3}$/, "Type how many wafers there are, such as 24.")])
  .default("")
  .transform((text) => (text === "" ? null : Number(text)));

const LENGTH = { ...RULES.bow, label: "reading" };

/** Where and when an entry was written; its id is made before it is sent, so that it counts once. */
const about = {
  id: z.uuid("Open the page again."),
  revision: z.uuid("Open the page again."),
  leg: z
    .string()
    .regex(/^\d{1,2}$/)
    .default("0")
    .transform(Number),
  step: z
    .union([z.literal(""), z.string().regex(/^\d{1,3}$/)])
    .default("")
    .transform((text) => (text === "" ? null : Number(text))),
  /** by the device; left out where it has no scripts */
  at: z.iso
    .datetime()
    .optional()
    .transform((text) => (text === undefined ? null : new Date(text))),
};

/** One entry as a form of the floor sends it, told apart by `kind`. Lengths become m. */
export const floorEntryForm = z.discriminatedUnion("kind", [
  z.object({ ...about, kind: z.literal("acknowledged") }),
  z.object({ ...about, kind: z.literal("started") }),
  z.object({ ...about, kind: z.literal("done"), count }),
  z.object({
    ...about,
    kind: z.literal("measured"),
    what: z.enum(["bow", "warp"], "Say whether it is bow or warp."),
    value: quantity(LENGTH),
    uncertainty: optionalQuantity({
      label: "uncertainty",
      dimension: "length",
      range: { least: 1e-9, most: 1e-3, words: "1 nm to 1 mm" },
    }),
    wafer: z.string().trim().max(80, "Keep the wafer’s name under 80 characters.").default(""),
    on: z.enum(MEASURED_ON, "Say what held the wafer."),
    sideUp: z.enum(MEASURED_SIDES, "Say which side was up."),
    gravity: z.enum(GRAVITY, "Say whether its own weight was taken out."),
    remark,
  }),
  z.object({ ...about, kind: z.literal("observed"), text: words("Write what you saw.", 1000), count }),
]);
export type FloorEntryForm = z.output<typeof floorEntryForm>;

type Without<Form> = Form extends unknown ? Omit<Form, keyof typeof about> : never;
/** What an entry says beside where and when; lengths in m. */
export type FloorContent = Without<FloorEntryForm>;
