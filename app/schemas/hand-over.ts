import { z } from "zod";
import type { Clock } from "#app/lib/floor/clocks.ts";
import { words } from "./written.ts";

/** A lot as it stood when its place was handed over. */
export interface HandOverLot {
  id: string;
  name: string;
  /** the carrier, frame or tool that it is on, as it was written */
  on: string;
  remark: string;
  /** number and letter; null where it is on no sheet */
  sheet: string | null;
  wafers: { total: number; inLine: number };
  /** 'step 9, Grind to 55 µm, is under way', one for each part of the lot */
  at: string[];
  clocks: Clock[];
  /** what keeps it from going on */
  blocks: string[];
  /** readings beyond what their step stands, and what was seen, of the hours before */
  odd: string[];
}

/** A lot that may be handed over, and where it was when that was last written. */
export interface LotAtPlace {
  id: string;
  name: string;
  program: string;
  sheet: string | null;
  on: string;
  /** where it was handed over last */
  place: string;
}

export interface HandOverRow {
  id: string;
  program: string;
  place: string;
  lots: number;
  by: string;
  at: string;
  taken: { by: string; at: string } | null;
  /** given anew for the same place since, so that this one is not taken any more */
  replaced: boolean;
  own: boolean;
}

export interface HandOverView extends HandOverRow {
  remark: string;
  takenRemark: string;
  content: HandOverLot[];
  /** names of lots that stand otherwise by now */
  moved: string[];
  mayTake: boolean;
}

const line = (most: number) => z.string().trim().max(most, `Keep it under ${most} characters.`).default("");

/** What a shift leaves at a place: of the lots on the page, those that are there. */
export const giveForm = z
  .object({
    given: z.uuid("Open the page again."),
    place: words("Name the place: the tool, bench or cabinet.", 80),
    remark: line(600),
    lots: z
      .array(z.object({ lot: z.uuid().optional(), on: line(80), remark: line(200) }))
      .max(100)
      .default([]),
  })
  .superRefine(({ lots }, context) => {
    if (!lots.some(({ lot }) => lot !== undefined))
      context.addIssue({ code: "custom", path: ["lots"], message: "Tick the lots that are there." });
    for (const [index, { lot, on }] of lots.entries())
      if (lot !== undefined && on === "")
        context.addIssue({
          code: "custom",
          path: ["lots", index, "on"],
          message: "Say which carrier, frame or tool it is on.",
        });
  });
export type GiveForm = z.output<typeof giveForm>;

export const takeForm = z.object({ remark: line(600) });
