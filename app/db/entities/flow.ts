import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { WaferKind } from "#app/engine/flow/handling-inputs.ts";
import type { Measured } from "#app/engine/measured.ts";
import { Program } from "./program.ts";
import { recordProperties } from "./record.ts";
import { Silicon } from "./silicon.ts";

/** The ordered steps that a wafer goes through. */
export const Flow = defineEntity({
  name: "Flow",
  tableName: "flow",
  uniques: [{ properties: ["program", "name"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    name: p.text(),
    note: p.text(),
    silicon: () => p.manyToOne(Silicon),
    /** silicon as it comes in, m */
    incomingThickness: p.json<Measured>(),
    /** standard bow that it was measured to come in with, along the notch and across it, m; both or neither */
    incomingBowAlong: p.json<Measured>().nullable(),
    incomingBowAcross: p.json<Measured>().nullable(),
    /** share of that bow which films cause, 0 to 1; null when nobody knows */
    incomingFilmShare: p.json<Measured>().nullable(),
    waferKind: p.text().$type<WaferKind>(),
    /** bow and warp that an incoming wafer may have, m: the band is value ± tolerance, the warp the largest */
    gateBow: p.json<Measured>().nullable(),
    gateWarp: p.json<Measured>().nullable(),
    ...recordProperties,
  },
});
export type Flow = InferEntity<typeof Flow>;
