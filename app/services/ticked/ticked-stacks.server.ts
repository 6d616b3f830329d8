import { randomUUID } from "node:crypto";
import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { StackLayer } from "#app/db/entities/stack-layer.ts";
import { Stack } from "#app/db/entities/stack.ts";
import type { TickedRow, TickedRows } from "#app/lib/ticked-rows.ts";
import { mayInProgram, programsWhere } from "#app/policies/permissions.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { freeName, takingName } from "../flows/free-name.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { newRecord } from "../record.server.ts";

const EDIT = "edit stacks and flows";

type Found = Stack & { program: { id: string; name: string }; updatedBy?: { name: string } | null };

/** Those of some stacks that the person may see, in the order asked for; locked while something is done with them. */
async function seen(em: EntityManager, scope: ActorScope, ids: readonly string[], locked = false): Promise<Found[]> {
  const programs = programsWhere(scope.actor, "see the work").map(({ programId }) => programId);
  const found = await em.find(
    Stack,
    { id: { $in: [...ids] }, program: { $in: programs } },
    // Always in one order, so that two people who ticked the same ones do not wait for each other.
    { orderBy: { id: "asc" }, ...(locked ? { lockMode: LockMode.PESSIMISTIC_WRITE } : {}) },
  );
  await em.populate(found, ["program", "updatedBy"]);
  return ids.flatMap((id) => found.filter((stack) => stack.id === id) as Found[]);
}

const rowOf = (stack: Found, state: TickedRow["state"], words: string): TickedRow => ({
  id: stack.id,
  name: stack.name,
  program: stack.program.name,
  path: `/stacks/${stack.id}`,
  version: stack.version,
  state,
  words,
});

/** Why a stack stays as it is, with what to do about it; null when the person may change it. */
function refusal({ actor }: ActorScope, { program }: Found): string | null {
  if (mayInProgram(actor, EDIT, program.id)) return null;
  return `Your role in ${program.name} may not ${EDIT}. Ask its process owner.`;
}

/** What would become of each of the stacks that are ticked. @param words what is done with those that may be changed */
export async function tickedStacks(scope: ActorScope, ids: readonly string[], words: string): Promise<TickedRows> {
  requireInSomeProgram(scope, EDIT);
  return inScope(scope, async (em) => {
    const stacks = await seen(em, scope, ids);
    const rows = stacks.map((stack) => {
      const reason = refusal(scope, stack);
      return rowOf(stack, reason === null ? "to do" : "left", reason ?? words);
    });
    return { rows, hidden: ids.length - rows.length };
  });
}

/**
 * Removes stacks, all in one transaction. One that the person may not change, or that somebody has changed since it was looked at,
 * stays, and its row says so.
 * @param asked ids with the version that was looked at
 */
export async function removeStacks(scope: ActorScope, asked: ReadonlyMap<string, number>): Promise<TickedRows> {
  requireInSomeProgram(scope, EDIT);
  return inScope(scope, async (em) => {
    const stacks = await seen(em, scope, [...asked.keys()], true);
    const rows: TickedRow[] = [];
    for (const stack of stacks) {
      const reason = refusal(scope, stack) ?? changedSince(stack, asked.get(stack.id));
      if (reason !== null) {
        rows.push(rowOf(stack, "left", reason));
        continue;
      }
      rows.push({ ...rowOf(stack, "done", "Removed."), path: null });
      for (const layer of await em.find(StackLayer, { stack: stack.id })) em.remove(layer);
      em.remove(stack);
    }
    await em.flush();
    return { rows, hidden: asked.size - rows.length };
  });
}

function changedSince({ version, updatedAt, updatedBy }: Found, seenVersion: number | undefined): string | null {
  if (version === seenVersion) return null;
  const at = updatedAt.toISOString().slice(0, 16).replace("T", " ");
  return `${updatedBy?.name ?? "Somebody"} changed it at ${at} UTC, after you had ticked it. Look at it, then tick it again.`;
}

/** Adds a copy of each stack, under the first name that is free, all in one transaction. Rows are of the copies that were made. */
export async function duplicateStacks(scope: ActorScope, ids: readonly string[]): Promise<TickedRows> {
  requireInSomeProgram(scope, EDIT);
  return takingName(() =>
    inScope(scope, async (em) => {
      const stacks = await seen(em, scope, ids);
      const rows: TickedRow[] = [];
      for (const stack of stacks) {
        const reason = refusal(scope, stack);
        rows.push(reason === null ? await copied(em, scope, stack) : rowOf(stack, "left", reason));
      }
      return { rows, hidden: ids.length - rows.length };
    }),
  );
}

async function copied(em: EntityManager, scope: ActorScope, stack: Found): Promise<TickedRow> {
  const { program, note, silicon, siliconThickness } = stack;
  const namesakes = await em.find(Stack, { program: program.id }, { fields: ["name"] });
  const name = freeName(stack.name, new Set(namesakes.map((each) => each.name)));
  const copy = em.create(Stack, { ...newRecord(scope), program, name, note, silicon, siliconThickness });
  for (const layer of await em.find(StackLayer, { stack: stack.id })) {
    const { side, position, film, thickness, stress, coverage, lines } = layer;
    em.create(StackLayer, {
      id: randomUUID(),
      program,
      stack: copy,
      side,
      position,
      film,
      thickness,
      stress,
      coverage,
      lines,
    });
  }
  // The next copy asks which names are free.
  await em.flush();
  return { ...rowOf(copy as Found, "done", `Copy of ${stack.name}.`), program: program.name };
}
