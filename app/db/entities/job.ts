import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { JobInput, JobKind, JobOutcome, JobState } from "#app/schemas/job.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** Work that takes longer than a request, as the person who asked for it sees it. The queue itself holds nothing but its id. */
export const Job = defineEntity({
  name: "Job",
  tableName: "job",
  indexes: [{ properties: ["program", "createdAt"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    kind: p.text().$type<JobKind>(),
    /** what it is about, such as the names of files */
    title: p.text(),
    state: p.text().$type<JobState>(),
    done: p.double().$type<number>(),
    total: p.double().$type<number>(),
    /** of done and total */
    unit: p.text(),
    /** how it stands or why it failed; empty while there is nothing to say */
    sentence: p.text(),
    input: p.json<JobInput>(),
    outcome: p.json<JobOutcome>().nullable(),
    /** somebody wants it stopped; the job looks between two pieces of its work */
    stopAsked: p.boolean(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
    startedAt: p.datetime().nullable(),
    endedAt: p.datetime().nullable(),
  },
});
export type Job = InferEntity<typeof Job>;
