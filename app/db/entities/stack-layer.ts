import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import { Film } from "./film.ts";
import { Program } from "./program.ts";
import { Stack } from "./stack.ts";

/** One film of a stack; `position` counts from the silicon outwards on its side, from 0. */
export const StackLayer = defineEntity({
  name: "StackLayer",
  tableName: "stack_layer",
  indexes: [{ properties: ["stack", "side", "position"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    stack: () => p.manyToOne(Stack).deleteRule("cascade"),
    side: p.text().$type<Side>(),
    position: p.integer(),
    film: () => p.manyToOne(Film).index(),
    thickness: p.json<Measured>(),
    /** stress for this stack only; null takes the film's */
    stress: p.json<Measured>().nullable(),
    coverage: p.double().$type<number>(),
    /** of a film cut in lines; null bends both directions alike */
    lines: p.json<FilmLines>().nullable(),
  },
});
export type StackLayer = InferEntity<typeof StackLayer>;
