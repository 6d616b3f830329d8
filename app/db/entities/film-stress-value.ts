import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { FilmStressState } from "#app/schemas/film-stress.ts";
import { Film } from "./film.ts";
import { Person } from "./person.ts";
import { Scan } from "./scan.ts";

/**
 * One measured stress of a film that a person took into its history. Films are the whole site's and scans are a program's, so a
 * row holds figures and no name of a wafer; what `reason` says is for those alone who may see the scan. SI.
 */
export const FilmStressValue = defineEntity({
  name: "FilmStressValue",
  tableName: "film_stress_value",
  properties: {
    id: p.uuid().primary(),
    film: () => p.manyToOne(Film).index(),
    /** the scan that it comes from, which then cannot be deleted; null for a value that was typed */
    scan: () => p.manyToOne(Scan).nullable().unique().deleteRule("restrict"),
    /** Pa, tension positive, held flat on a rigid substrate at 25 °C */
    value: p.double().$type<number>(),
    /** of this value alone, Pa */
    standardUncertainty: p.double().$type<number>(),
    /** the part of it that values from other scans share, Pa: silicon's modulus */
    commonUncertainty: p.double().$type<number>(),
    filmThickness: p.double().$type<number>().nullable(),
    /** as the site calls it; empty when nobody named one */
    instrument: p.text(),
    measuredAt: p.datetime(),
    state: p.text().$type<FilmStressState>(),
    /** why it was accepted */
    reason: p.text(),
    /** where a value that was typed comes from; empty for one of a scan */
    source: p.text(),
    acceptedAt: p.datetime(),
    acceptedBy: () => p.manyToOne(Person),
    /** of the last time that it was set aside, also after it was put back */
    setAsideReason: p.text().nullable(),
    setAsideAt: p.datetime().nullable(),
    setAsideBy: () => p.manyToOne(Person).nullable(),
    putBackAt: p.datetime().nullable(),
    putBackBy: () => p.manyToOne(Person).nullable(),
    version: p.integer().version(),
  },
});
export type FilmStressValue = InferEntity<typeof FilmStressValue>;
