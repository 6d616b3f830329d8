import { searchText } from "#app/lib/list-params.ts";
import type { SearchAnswer } from "#app/schemas/search.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { keptGroups } from "./kept/kept-rows.server.ts";
import { findPages } from "./search/find-pages.ts";
import { findRecords } from "./search/find-records.server.ts";

/**
 * Everything of a name that the person may open: kinds whose pages their role does not open are not looked at, and of the others
 * only what lies in their programs. The kinds with the best fit come first.
 * @param asked as typed; blank gives what the person has marked and opened before
 */
export async function searchEverything(scope: ActorScope, asked: string | null): Promise<SearchAnswer> {
  const query = searchText(asked);
  if (query === "") {
    const groups = await inScope(scope, (em) => keptGroups(em, scope));
    return { query, groups, total: 0 };
  }
  const records = await inScope(scope, (em) => findRecords(em, scope, query));
  const groups = [...records, ...findPages(scope.actor, query)].toSorted((a, b) => a.best - b.best);
  return {
    query,
    groups: groups.map(({ best: _best, ...group }) => group),
    total: groups.reduce((sum, { total }) => sum + total, 0),
  };
}
