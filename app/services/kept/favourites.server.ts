import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Favourite } from "#app/db/entities/favourite.ts";
import type { KeptKind } from "#app/lib/kept-kinds.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { keptRows, mayOpen, type KeptRow } from "./kept-rows.server.ts";

/** More than anybody finds again. */
const MOST = 200;

/**
 * Marks a record for the person, or takes the mark away; doing either twice changes nothing.
 * @throws 404 for what is not there or not the person's to open, 409 when they have marked as many as are kept
 */
export async function setFavourite(scope: ActorScope, kind: KeptKind, id: string, marked: boolean): Promise<void> {
  const mine = { person: scope.actor.id, kind, recordId: id };
  await inScope(scope, async (em) => {
    if (!marked) {
      await em.nativeDelete(Favourite, mine);
      return;
    }
    if (!(await mayOpen(em, scope, kind, id))) throw notFound(kind);
    if ((await em.count(Favourite, { person: scope.actor.id })) >= MOST)
      throw problem(409, `You have marked ${MOST} things. Take a mark away, then set this one.`);
    await insertMark(em, scope, kind, id);
  });
}

/**
 * Marks several records of a kind, all in one transaction; those that are not the person's to open are passed over.
 * @returns how many of them are marked now, whether before or not
 * @throws 409 when there would be more than are kept; nothing is marked then
 */
export async function markFavourites(scope: ActorScope, kind: KeptKind, ids: readonly string[]): Promise<number> {
  return inScope(scope, async (em) => {
    let marked = 0;
    for (const id of ids) {
      if (!(await mayOpen(em, scope, kind, id))) continue;
      await insertMark(em, scope, kind, id);
      marked++;
    }
    if ((await em.count(Favourite, { person: scope.actor.id })) > MOST)
      throw problem(
        409,
        `No more than ${MOST} marks are kept, and these would be more. Take marks away, or tick fewer.`,
      );
    return marked;
  });
}

function insertMark(em: EntityManager, scope: ActorScope, kind: KeptKind, id: string) {
  return em.execute(
    `insert into favourite (id, person_id, kind, record_id, at) values (?, ?, ?, ?, clock_timestamp())
       on conflict (person_id, kind, record_id) do nothing`,
    [randomUUID(), scope.actor.id, kind, id],
  );
}

/** Everything that the person has marked and may open, the newest first. */
export async function listFavourites(scope: ActorScope): Promise<KeptRow[]> {
  return inScope(scope, async (em) => (await keptRows(em, scope, "favourite", MOST)).rows);
}

/** Ids of what the person has marked of a kind, for a list that shows nothing else. */
export async function favouriteIds(em: EntityManager, { actor }: ActorScope, kind: KeptKind): Promise<string[]> {
  const marked = await em.find(Favourite, { person: actor.id, kind }, { fields: ["recordId"] });
  return marked.map(({ recordId }) => recordId);
}
