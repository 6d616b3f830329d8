import { randomUUID } from "node:crypto";
import { SavedFilter } from "#app/db/entities/saved-filter.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { idFrom } from "../uuid.server.ts";

/** Filters that a person can keep of one list. */
export const MOST_FILTERS = 20;

/**
 * Keeps the search of a list under a name. One of that name, whatever its capitals, is replaced by it.
 * @returns why it was not kept, or null
 */
export async function keepFilter(
  scope: ActorScope,
  { list, name, query }: { list: string; name: string; query: string },
): Promise<string | null> {
  return inScope(scope, async (em) => {
    const kept = await em.find(SavedFilter, { person: scope.actor.id, list });
    const namesake = kept.find((filter) => filter.name.toLowerCase() === name.toLowerCase());
    if (!namesake && kept.length >= MOST_FILTERS)
      return `You keep ${MOST_FILTERS} searches of this list. Remove one, then keep this one.`;
    const at = new Date();
    if (namesake) em.assign(namesake, { name, query, at });
    else em.create(SavedFilter, { id: randomUUID(), person: scope.actor.id, list, name, query, at });
    await em.flush();
    return null;
  });
}

/** Removes a kept search; one that is gone, or is not the person's own, is gone. */
export async function removeFilter(scope: ActorScope, id: string): Promise<void> {
  await inScope(scope, (em) =>
    em.nativeDelete(SavedFilter, { id: idFrom(id, "saved search"), person: scope.actor.id }),
  );
}
