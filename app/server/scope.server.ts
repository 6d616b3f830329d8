import type { EntityManager } from "@mikro-orm/postgresql";
import { orm } from "#app/db/orm.server.ts";
import type { Actor } from "#app/policies/roles.ts";
import type { CodesState } from "#app/policies/codes.ts";
import { noteScope } from "./audit.server.ts";

/** On whose behalf work on the database is done, and in which request. */
export interface Scope {
  personId: string | null;
  /** true only for the few queries that find out who is asking */
  atTheDoor?: boolean;
  /** true only where the worker takes a job up and notes how far it is */
  atWork?: boolean;
  requestId: string;
}

/** The session that a request came with. */
export interface SessionOfScope {
  id: string;
  /** when the person last proved who they are, ms since 1970 */
  provenAt: number;
  codes: CodesState;
}

/** The scope of a signed-in person's request. */
export interface ActorScope {
  actor: Actor;
  /** missing where the person does not act by a browser, such as in a job */
  session?: SessionOfScope | null;
  requestId: string;
  /** the one program that a request with a token is for; row-level security then knows no other */
  onlyProgram?: string;
  /** true only where the demo is loaded or taken out */
  atTheDemo?: boolean;
}

/** Tells row-level security, for the rest of this transaction, whose data may be seen. */
export async function tellPerson(em: EntityManager, personId: string | null): Promise<void> {
  await em.execute("select set_config('app.person', ?, true)", [personId ?? ""]);
}

/**
 * The one door to the database: a manager of its own, one transaction, and the person told to row-level security, so that a
 * forgotten filter returns nothing. What `work` throws rolls everything back.
 */
export async function inScope<T>(scope: Scope | ActorScope, work: (em: EntityManager) => Promise<T>): Promise<T> {
  const personId = "actor" in scope ? scope.actor.id : scope.personId;
  const door = doorOf(scope);
  const { em: shared } = await orm();
  const em = shared.fork({ clear: true });
  return em.transactional(async (transaction) => {
    await tellPerson(transaction, personId);
    await transaction.execute("select set_config('app.door', ?, true)", [door]);
    await transaction.execute("select set_config('app.program', ?, true)", [programOf(scope)]);
    noteScope(transaction, { personId, requestId: scope.requestId });
    return work(transaction as EntityManager);
  });
}

const programOf = (scope: Scope | ActorScope) => ("actor" in scope ? (scope.onlyProgram ?? "") : "");

function doorOf(scope: Scope | ActorScope): string {
  if ("actor" in scope) return scope.atTheDemo ? "demo" : "";
  if (scope.atTheDoor) return "sign-in";
  return scope.atWork ? "worker" : "";
}
