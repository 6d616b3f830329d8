import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { FilmKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmHandlingValues } from "#app/schemas/library-handling.ts";
import { recordProperties } from "./record.ts";

/** A film of the site's library; SI values, each with its own provenance. */
export const Film = defineEntity({
  name: "Film",
  tableName: "film",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    kind: p.text().$type<FilmKind>(),
    note: p.text(),
    /** at 25 °C on a full-thickness monitor held flat, Pa, tension positive */
    stress: p.json<Measured>(),
    /** state the stress was measured in: as deposited, after cure … */
    stressState: p.text(),
    youngsModulus: p.json<Measured>(),
    poissonsRatio: p.json<Measured>(),
    expansion: p.json<Measured>(),
    /** at 25 °C, Pa; only for metals that yield */
    yieldStress: p.json<Measured>().nullable(),
    /** of a polymer: from here on it carries no stress, K; null leaves that to its expansion */
    zeroStressTemperature: p.json<Measured>().nullable(),
    temperatureLimit: p.json<Measured>().nullable(),
    /** what only the handling rules ask */
    handling: p.json<FilmHandlingValues>(),
    ...recordProperties,
  },
});
export type Film = InferEntity<typeof Film>;
