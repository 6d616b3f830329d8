import { randomUUID } from "node:crypto";
import type { KeptKind } from "#app/lib/kept-kinds.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { mayOpen } from "./kept-rows.server.ts";

/** Visits that are kept of a person; ten are shown, the rest stands in for those that are gone. */
const KEPT = 30;

/** Notes that a person has opened the page of a record; nothing of what they may not open. */
export async function noteVisit(scope: ActorScope, kind: KeptKind, id: string): Promise<void> {
  await inScope(scope, async (em) => {
    if (!(await mayOpen(em, scope, kind, id))) return;
    await em.execute(
      `insert into recent_visit (id, person_id, kind, record_id, at) values (?, ?, ?, ?, clock_timestamp())
         on conflict (person_id, kind, record_id) do update set at = excluded.at`,
      [randomUUID(), scope.actor.id, kind, id],
    );
    await em.execute(
      `delete from recent_visit where person_id = ? and id not in
         (select id from recent_visit where person_id = ? order by at desc limit ${KEPT})`,
      [scope.actor.id, scope.actor.id],
    );
  });
}
