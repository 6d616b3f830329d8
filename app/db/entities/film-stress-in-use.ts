import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import { Film } from "./film.ts";
import { Person } from "./person.ts";

/** A stress that a film had in use, from `since` until the next one. The database adds a row whenever a film's stress is saved. */
export const FilmStressInUse = defineEntity({
  name: "FilmStressInUse",
  tableName: "film_stress_in_use",
  indexes: [{ properties: ["film", "since"] }],
  properties: {
    id: p.uuid().primary(),
    film: () => p.manyToOne(Film),
    stress: p.json<Measured>(),
    since: p.datetime(),
    /** null: delivered with Planeward */
    by: () => p.manyToOne(Person).nullable(),
  },
});
export type FilmStressInUse = InferEntity<typeof FilmStressInUse>;
