import { z } from "zod";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { REVISION_STATES } from "#app/schemas/sheet-revision.ts";
import { inScope } from "#app/server/scope.server.ts";
import { requireInSomeProgram } from "../../permission.server.ts";
import { programFilter } from "../../program-filter.server.ts";
import { findRevision, type FoundRevision } from "../../sheets/revision.server.ts";
import { operation } from "../operation.server.ts";
import { keysetPage, pageOf, pageQuery } from "../paging.server.ts";
import { id, idParam, moment, programQuery, programSlug } from "../shapes.ts";

const state = z.enum(REVISION_STATES);
const revision = z
  .object({
    id,
    sheet: z.string().describe("As paper has it, such as TERN-H001."),
    letter: z.string().nullable().describe("Null before the release."),
    state,
    title: z.string(),
    program: programSlug,
    assessment_id: id,
    asked_at: moment,
    decided_at: moment.nullable().describe("When it was released or returned."),
    ended_at: moment.nullable().describe("When it was superseded or withdrawn."),
    superseded_by: z.string().nullable(),
  })
  .describe("Work by a revision only while its state is released, and by the site’s own procedures.");

const revisionJson = (
  found: Pick<FoundRevision, keyof SheetRevision & keyof FoundRevision>,
): z.input<typeof revision> => ({
  id: found.id,
  sheet: recordNumber("sheet", found.program.slug, found.sheet.number),
  letter: found.number ? revisionLetters(found.number) : null,
  state: found.state,
  title: found.title,
  program: found.program.slug,
  assessment_id: found.assessment.id,
  asked_at: found.askedAt.toISOString(),
  decided_at: found.decidedAt?.toISOString() ?? null,
  ended_at: found.endedAt?.toISOString() ?? null,
  superseded_by: found.supersededBy ? revisionLetters(found.supersededBy) : null,
});

export const sheetOperations = [
  operation({
    id: "listSheetRevisions",
    method: "GET",
    path: "/sheet-revisions",
    scope: "sheets:read",
    group: "Sheets",
    summary: "Revisions of handling-risk sheets with their status, the newest first",
    query: z.strictObject({ ...pageQuery, ...programQuery, state: state.optional() }),
    answer: pageOf(revision),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see released sheets");
      const where = {
        program: programFilter(scope.actor, "see released sheets", query.program),
        ...(query.state !== undefined && { state: query.state }),
      };
      const { rows, next_cursor } = await inScope(scope, (em) =>
        keysetPage(em, SheetRevision, where, "askedAt", query, { populate: ["sheet", "program"] }),
      );
      return { answer: { data: rows.map(revisionJson), next_cursor } };
    },
  }),
  operation({
    id: "getSheetRevision",
    method: "GET",
    path: "/sheet-revisions/{revision_id}",
    scope: "sheets:read",
    group: "Sheets",
    summary: "One revision with its status",
    params: idParam("revision_id"),
    answer: revision,
    handle: async ({ scope, params }) => ({
      answer: revisionJson(
        await inScope(scope, (em) => findRevision(em, scope, params.revision_id, "see released sheets")),
      ),
    }),
  }),
];
