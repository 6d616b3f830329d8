import {
  OptimisticLockError,
  UniqueConstraintViolationException,
  type EntityManager,
  type EntityName,
} from "@mikro-orm/core";
import { randomUUID } from "node:crypto";
import type { Person } from "#app/db/entities/person.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import { keepUnchanged } from "#app/lib/keep-unchanged.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

/** What every editable record has; see `recordProperties` of the entities. */
interface EditableRecord {
  id: string;
  name: string;
  version: number;
  createdAt: Date;
  updatedAt: Date;
  updatedBy?: Pick<Person, "id" | "name"> | null;
}

/** Somebody else saved the record between this person's reading and saving it. */
export interface Conflict {
  by: string;
  at: string;
  /** version to send along when the person decides to save over it; null when it has to be read again first */
  version: number | null;
}

export type Saved =
  { outcome: "saved"; id: string } | { outcome: "conflict"; conflict: Conflict } | { outcome: "name taken" };

/**
 * Runs a save and puts what the database itself refused into the same words: two people saving at the same moment get the same
 * answer as two who saved a minute apart.
 */
export async function saving<Other = never>(work: () => Promise<Saved | Other>): Promise<Saved | Other> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException) return { outcome: "name taken" };
    if (error instanceof OptimisticLockError)
      return { outcome: "conflict", conflict: { by: "Somebody", at: new Date().toISOString(), version: null } };
    throw error;
  }
}

/** Columns that `newRecord` fills in for a new record. */
export function newRecord(scope: ActorScope) {
  const now = new Date();
  return { id: randomUUID(), createdAt: now, createdBy: scope.actor.id, updatedAt: now, updatedBy: scope.actor.id };
}

/** Marks a record as changed by the actor now, which also moves its version on. */
export function touch(record: { updatedAt: Date }, scope: ActorScope): void {
  Object.assign(record, { updatedAt: new Date(), updatedBy: scope.actor.id });
}

export function stampOf(record: {
  version: number;
  updatedAt: Date;
  updatedBy?: { name?: string } | null;
}): RecordStamp {
  return {
    version: record.version,
    updatedAt: record.updatedAt.toISOString(),
    updatedBy: record.updatedBy?.name ?? "delivered with Planeward",
  };
}

/** The conflict when a record has moved on since `version`, or null. */
export function conflictOf(record: EditableRecord, version: number | null): Conflict | null {
  if (version === null || record.version === version) return null;
  return { by: record.updatedBy?.name ?? "Somebody", at: record.updatedAt.toISOString(), version: record.version };
}

/**
 * Creates or changes a record of the library. Names are unique; a version that is no longer current is a conflict, and nothing
 * is written then. The caller has checked that the actor may.
 * @throws 404 when the id names nothing
 */
export async function saveNamedRecord(
  em: EntityManager,
  entity: EntityName<EditableRecord>,
  what: string,
  scope: ActorScope,
  {
    id,
    version,
    values,
  }: { id: string | null; version: number | null; values: { name: string } & Record<string, unknown> },
): Promise<Saved> {
  const namesake = await em.findOne(entity, { name: values.name });
  if (namesake && namesake.id !== id) return { outcome: "name taken" };
  if (id === null) {
    const created = em.create(entity, { ...newRecord(scope), ...values } as never);
    await em.flush();
    return { outcome: "saved", id: created.id };
  }
  const record = await em.findOne(entity, { id }, { populate: ["updatedBy"] as never });
  if (!record) throw notFound(what);
  const conflict = conflictOf(record, version);
  if (conflict) return { outcome: "conflict", conflict };
  em.assign(record, keepUnchanged(record, values) as never, { mergeObjectProperties: false });
  touch(record, scope);
  await em.flush();
  return { outcome: "saved", id };
}
