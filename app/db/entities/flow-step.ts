import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { StepKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Exposure, Holding } from "#app/engine/vocabulary.ts";
import type { StepHandlingValues } from "#app/schemas/step-handling.ts";
import { BondingMaterial } from "./bonding-material.ts";
import { Carrier } from "./carrier.ts";
import { Equipment } from "./equipment.ts";
import { Flow } from "./flow.ts";
import { Program } from "./program.ts";
import { Tape } from "./tape.ts";

/** One step of a flow; `position` counts from 0. */
export const FlowStep = defineEntity({
  name: "FlowStep",
  tableName: "flow_step",
  indexes: [{ properties: ["flow", "position"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    flow: () => p.manyToOne(Flow).deleteRule("cascade"),
    position: p.integer(),
    kind: p.text().$type<StepKind>(),
    title: p.text(),
    /** K */
    peakTemperature: p.double().$type<number>(),
    /** s */
    holdTime: p.double().$type<number>().nullable(),
    equipment: () => p.manyToOne(Equipment).nullable(),
    exposures: p.json<Exposure[]>(),
    planned: p.text().$type<Holding>(),
    siliconAfter: p.json<Measured>().nullable(),
    trimWidth: p.json<Measured>().nullable(),
    trimDepth: p.json<Measured>().nullable(),
    carrier: () => p.manyToOne(Carrier).nullable(),
    bondingMaterial: () => p.manyToOne(BondingMaterial).nullable(),
    bondThickness: p.json<Measured>().nullable(),
    groundFaceForce: p.json<Measured>().nullable(),
    /** tape that it is put on; what `handling` says of a tape counts before it */
    tape: () => p.manyToOne(Tape).nullable(),
    /** contact, times, tape, bumps: what the handling rules ask beyond the physics */
    handling: p.json<StepHandlingValues>(),
  },
});
export type FlowStep = InferEntity<typeof FlowStep>;
