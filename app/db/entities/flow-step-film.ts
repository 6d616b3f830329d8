import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import { Film } from "./film.ts";
import { FlowStep } from "./flow-step.ts";
import { Program } from "./program.ts";

/** A film that a step adds or takes off. A removal has neither thickness nor stress. */
export const FlowStepFilm = defineEntity({
  name: "FlowStepFilm",
  tableName: "flow_step_film",
  indexes: [{ properties: ["step", "position"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    step: () => p.manyToOne(FlowStep).deleteRule("cascade"),
    position: p.integer(),
    change: p.text().$type<"adds" | "removes">(),
    side: p.text().$type<Side>(),
    film: () => p.manyToOne(Film).index(),
    thickness: p.json<Measured>().nullable(),
    /** for this step only; null takes the film's */
    stress: p.json<Measured>().nullable(),
    coverage: p.double().$type<number>(),
    /** of a film cut in lines; null bends both directions alike */
    lines: p.json<FilmLines>().nullable(),
  },
});
export type FlowStepFilm = InferEntity<typeof FlowStepFilm>;
