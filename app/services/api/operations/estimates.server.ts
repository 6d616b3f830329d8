import { z } from "zod";
import { SUPPORT_CLASSES } from "#app/engine/vocabulary.ts";
import { estimateSchema } from "#app/schemas/estimate.ts";
import { estimate } from "../../estimates.server.ts";
import { operation } from "../operation.server.ts";

const regime = z.enum(["linear", "nonlinear", "curled"]);
const working = z.record(z.string(), z.unknown()).describe("A calculation with its equation, inputs and result.");

const answer = z.object({
  engine_version: z.string(),
  stoney: z.object({ bow_m: z.number() }).describe("Thin-film formula, films added up."),
  laminate: z.object({ bow_m: z.number() }).describe("Laminate theory, small deflections."),
  shape: z.object({
    regime,
    bow_m: z.number().describe("Positive when the centre lies above the rim with the device side up."),
    across: z.object({ bow_m: z.number(), axis_rad: z.number() }).nullable(),
    warp_m: z.number().describe("Peak to valley."),
    roll_radius_m: z.number().nullable(),
    stability_ratio: z.number(),
    warp_standard_uncertainty_m: z.number().nullable(),
    warp_linear: z.boolean().nullable(),
  }),
  support: z.object({ class: z.enum(SUPPORT_CLASSES).nullable(), because: z.string() }),
  film_force: z.object({
    front_N_per_m: z.number(),
    back_N_per_m: z.number(),
    films_N_per_m: z.array(z.number()),
  }),
  curls_below_m: z.number().nullable(),
  sweep: z
    .array(z.object({ thickness_m: z.number(), warp_m: z.number(), linear_warp_m: z.number(), regime }))
    .optional(),
  working: z.object({ shape: working, stoney: working, film_forces: z.array(working) }).optional(),
});

export const estimateOperations = [
  operation({
    id: "estimate",
    method: "POST",
    path: "/estimates",
    scope: "estimates:run",
    group: "Estimates",
    summary: "Bow, warp and support of films on a free wafer. Nothing is stored",
    body: estimateSchema,
    answer,
    handle: async ({ scope, body }) => ({ answer: (await estimate(scope, body)) as unknown as z.input<typeof answer> }),
  }),
];
