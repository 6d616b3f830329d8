import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import type { SourceKind } from "#app/engine/vocabulary.ts";
import type { TapeKind } from "#app/lib/tape-kinds.ts";
import type { TapeHandlingValues } from "#app/schemas/library-handling.ts";
import { recordProperties } from "./record.ts";

/** A kind of tape. Nothing but its name has to be known: what is missing the rules take from the site's limits, or say so. */
export const Tape = defineEntity({
  name: "Tape",
  tableName: "tape",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    kind: p.text().$type<TapeKind>(),
    note: p.text(),
    /** with its adhesive, m */
    thickness: p.json<Measured>().nullable(),
    /** K */
    temperatureLimit: p.json<Measured>().nullable(),
    /** soft layer that takes up bumps, m; zero when it has none */
    embeddingDepth: p.json<Measured>().nullable(),
    thicknessVariation: p.json<Measured>().nullable(),
    /** s */
    longestTime: p.json<Measured>().nullable(),
    /** what it stands, and whether light lets it go */
    handling: p.json<TapeHandlingValues>(),
    /** where `handling` comes from */
    handlingSource: p.text().$type<SourceKind>(),
    ...recordProperties,
  },
});
export type Tape = InferEntity<typeof Tape>;
