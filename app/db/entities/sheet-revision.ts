import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { RevisionState } from "#app/schemas/sheet-revision.ts";
import { Assessment } from "./assessment.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { Sheet } from "./sheet.ts";

/**
 * One attempt to release a sheet from one assessment, from the asking for a review to its end. What it rests on never changes, and its
 * state only goes forward: the database holds both.
 */
export const SheetRevision = defineEntity({
  name: "SheetRevision",
  tableName: "sheet_revision",
  uniques: [{ properties: ["sheet", "number"] }],
  indexes: [
    {
      name: "sheet_revision_one_in_review",
      expression: `create unique index "sheet_revision_one_in_review" on "sheet_revision" ("sheet_id") where state = 'in review'`,
    },
    {
      name: "sheet_revision_one_released",
      expression: `create unique index "sheet_revision_one_released" on "sheet_revision" ("sheet_id") where state = 'released'`,
    },
  ],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    sheet: () => p.manyToOne(Sheet),
    assessment: () => p.manyToOne(Assessment).index(),
    /** what the flow was called */
    title: p.text(),
    /** the letter as a number, from 1, given at the release; null before */
    number: p.integer().nullable(),
    state: p.text().$type<RevisionState>(),
    /** SHA-256 of inputs and results, as they were when the review was asked for */
    inputHash: p.text(),
    resultHash: p.text(),
    /** what whoever asked says to the reviewer */
    note: p.text(),
    askedAt: p.datetime(),
    askedBy: () => p.manyToOne(Person).deleteRule("restrict"),
    /** when and by whom it was released or returned, and why or with which remark */
    decidedAt: p.datetime().nullable(),
    decidedBy: () => p.manyToOne(Person).nullable().deleteRule("restrict"),
    reason: p.text().nullable(),
    /** what changed since the last released one, at most three lines */
    changes: p.json<string[]>().nullable(),
    /** opens the public page of its status, which the code on paper leads to */
    token: p.text().nullable().unique(),
    /** letter of the one that took its place, as a number */
    supersededBy: p.integer().nullable(),
    /** when it was superseded or withdrawn; by whom and why it was withdrawn */
    endedAt: p.datetime().nullable(),
    endedBy: () => p.manyToOne(Person).nullable().deleteRule("restrict"),
    endReason: p.text().nullable(),
  },
});
export type SheetRevision = InferEntity<typeof SheetRevision>;
