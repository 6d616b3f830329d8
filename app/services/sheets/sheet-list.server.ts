import { raw, type QueryOrderMap } from "@mikro-orm/postgresql";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { readRecordNumber, recordNumber } from "#app/lib/record-number.ts";
import { REVISION_STATES } from "#app/schemas/sheet-revision.ts";
import type { SheetRow } from "#app/schemas/sheet-view.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";

export const SHEET_SORTS = ["state", "sheet", "flow", "date"] as const;

/** A page of the revisions of sheets that the person may see; of their own programs a guest gets those that are released. */
export async function listSheets(scope: ActorScope, params: ListParams): Promise<ListPage<SheetRow>> {
  requireInSomeProgram(scope, "see released sheets");
  return inScope(scope, async (em) => {
    const state = REVISION_STATES.find((word) => word === params.filters["state"]);
    const [revisions, total] = await em.findAndCount(
      SheetRevision,
      {
        program: programFilter(scope.actor, "see released sheets", params.filters["program"]),
        ...(state ? { state } : {}),
        ...(params.query ? namedLike(params.query) : {}),
      },
      {
        populate: ["sheet", "program"],
        orderBy: [...orderOf(params), { id: "asc" }],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const rows = revisions.map((revision): SheetRow => {
      const { id, assessment, sheet, program, number, title, askedAt, decidedAt, supersededBy } = revision;
      return {
        id,
        assessmentId: assessment.id,
        sheet: recordNumber("sheet", program.slug, sheet.number),
        letter: number ? revisionLetters(number) : null,
        state: revision.state,
        flow: title,
        program: program.name,
        at: (decidedAt ?? askedAt).toISOString(),
        supersededBy: supersededBy ? revisionLetters(supersededBy) : null,
      };
    });
    return { rows, total, params };
  });
}

/** By the name of the flow, or by the number that stands on paper. */
function namedLike(query: string) {
  const numbered = readRecordNumber("sheet", query);
  if (!numbered) return { title: { $ilike: `%${escapeLike(query)}%` } };
  return { sheet: { number: numbered.number, program: { slug: numbered.slug } } };
}

/** By default what waits for somebody first, then what is in force, then what has ended; the newest of each first. */
function orderOf({ sort, descending }: ListParams): QueryOrderMap<SheetRevision>[] {
  const direction = descending ? "desc" : "asc";
  if (sort === "flow") return [{ title: direction }];
  if (sort === "sheet") return [{ program: { slug: direction } }, { sheet: { number: direction } }, { number: "desc" }];
  if (sort === "date") return [{ [raw((alias) => `coalesce(${alias}.decided_at, ${alias}.asked_at)`)]: direction }];
  const words = ["in review", "released", "returned", "superseded", "withdrawn"].map((word) => `'${word}'`).join(", ");
  const rank = raw((alias) => `array_position(array[${words}]::text[], ${alias}.state)`);
  return [{ [rank]: direction }, { askedAt: "desc" }];
}
