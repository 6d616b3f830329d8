import type { ActorScope } from "#app/server/scope.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { allOfLibrary } from "../library/library.server.ts";

/**
 * Those films of the library that are ticked, by name; what is not there any more is passed over.
 * @throws 400 when none of them is there, since a table of nothing would say that the library is empty
 */
export async function tickedFilms(scope: ActorScope, ids: readonly string[]) {
  const asked = new Set(ids);
  const films = (await allOfLibrary(scope, "film")).filter(({ id }) => asked.has(id));
  if (films.length === 0)
    throw problem(400, "No film of the library is ticked. Go back to the list, tick films and download them again.");
  return films;
}
