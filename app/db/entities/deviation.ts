import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { SheetRevision } from "./sheet-revision.ts";

/** A finding that blocks a release and is run all the same: why, for what, until when, and the two people who sign. */
export const Deviation = defineEntity({
  name: "Deviation",
  tableName: "deviation",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    revision: () => p.manyToOne(SheetRevision).index(),
    /** the findings that it is for, by `findingKey` */
    findings: p.json<string[]>(),
    reason: p.text(),
    /** which lots, wafers or tools it is for */
    scope: p.text(),
    /** last moment at which it counts */
    until: p.datetime(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
    /** the second signature, of somebody else; null while it is missing and nothing counts */
    signedAt: p.datetime().nullable(),
    signedBy: () => p.manyToOne(Person).nullable().deleteRule("restrict"),
  },
});
export type Deviation = InferEntity<typeof Deviation>;
