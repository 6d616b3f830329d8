import { randomUUID } from "node:crypto";
import { LockMode } from "@mikro-orm/postgresql";
import { Delegation } from "#app/db/entities/delegation.ts";
import { mayInProgram, programsWhere } from "#app/policies/permissions.ts";
import type { DelegatesView, DelegationRow, DelegationValues } from "#app/schemas/delegation.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram, requireInSomeProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { peopleOf } from "./people-of.server.ts";

const NAME = "name a delegate";

/** How many are listed: those of years ago are found in the audit trail. */
const LISTED = 200;

/** Who stands in for whom in the programs whose work the person sees, what runs and comes first. */
export async function delegations(scope: ActorScope): Promise<DelegatesView> {
  requireInSomeProgram(scope, "see the work");
  return inScope(scope, async (em) => {
    const found = await em.find(
      Delegation,
      { program: { $in: programsWhere(scope.actor, "see the work").map(({ programId }) => programId) } },
      { populate: ["program", "owner", "delegate"], orderBy: { endsAt: "desc", id: "asc" }, limit: LISTED },
    );
    const rows = found.map((each): DelegationRow => {
      const state = stateOf(each);
      return {
        id: each.id,
        program: each.program.name,
        owner: each.owner.name,
        delegate: each.delegate.name,
        from: dayOf(each.beginsAt),
        until: dayOf(each.endsAt),
        reason: each.reason,
        state,
        endedAt: each.endedAt ? dayOf(each.endedAt) : null,
        mayEnd:
          (state === "running" || state === "coming") && [each.owner.id, each.delegate.id].includes(scope.actor.id),
      };
    });
    const choices = [];
    for (const { programId, programName } of programsWhere(scope.actor, NAME)) {
      const people = (await peopleOf(em, programId)).filter(
        ({ id, role }) => id !== scope.actor.id && role !== "guest" && role !== "process owner",
      );
      choices.push({
        program: programName,
        people: people.map(({ id, name, role }) => ({ value: `${programId} ${id}`, label: `${name}, ${role}` })),
      });
    }
    const running = (row: DelegationRow) => (row.state === "running" || row.state === "coming" ? 0 : 1);
    return { rows: rows.toSorted((a, b) => running(a) - running(b)), choices };
  });
}

const dayOf = (date: Date) => date.toISOString().slice(0, 10);

function stateOf({ beginsAt, endsAt, endedAt }: Pick<Delegation, "beginsAt" | "endsAt" | "endedAt">) {
  const now = new Date();
  if (endedAt) return "ended";
  if (endsAt <= now) return "over";
  return beginsAt > now ? "coming" : "running";
}

/** Names somebody who stands in for the actor; a sentence where it does not work out, null when it is done. */
export async function nameDelegate(
  scope: ActorScope,
  { whom, from, until, reason }: DelegationValues,
): Promise<string | null> {
  requireInProgram(scope, NAME, whom.program, "program");
  return inScope(scope, async (em) => {
    const person = (await peopleOf(em, whom.program)).find(({ id }) => id === whom.person);
    if (!person || person.id === scope.actor.id || person.role === "guest")
      return "Choose somebody else of the program who sees its work.";
    if (person.role === "process owner") return `${person.name} is a process owner of this program already.`;
    await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`delegates of ${scope.actor.id}`]);
    const other = await em.findOne(Delegation, {
      program: whom.program,
      owner: scope.actor.id,
      delegate: person.id,
      endedAt: null,
      beginsAt: { $lt: until },
      endsAt: { $gt: from },
    });
    if (other)
      return `${person.name} stands in for you from ${dayOf(other.beginsAt)} to ${dayOf(other.endsAt)} already. End that one first, or choose other days.`;
    em.create(Delegation, {
      id: randomUUID(),
      program: whom.program,
      owner: scope.actor.id,
      delegate: person.id,
      beginsAt: from,
      endsAt: until,
      reason,
      createdAt: new Date(),
    });
    await em.flush();
    return null;
  });
}

/** Ends a delegation before its time: either of the two may. */
export async function endDelegation(scope: ActorScope, id: string): Promise<void> {
  requireInSomeProgram(scope, "see the work");
  await inScope(scope, async (em) => {
    const found = await em.findOne(Delegation, { id: idFrom(id, "delegation") }, { populate: ["owner"] });
    if (!found || !mayInProgram(scope.actor, "see the work", found.program.id)) throw notFound("delegation");
    if (![found.owner.id, found.delegate.id].includes(scope.actor.id))
      throw problem(403, `Only ${found.owner.name} or who stands in may end it.`);
    await em.lock(found, LockMode.PESSIMISTIC_WRITE);
    await em.refresh(found);
    if (found.endedAt || found.endsAt <= new Date()) throw problem(409, "It has ended already. Open the page again.");
    Object.assign(found, { endedAt: new Date(), endedBy: scope.actor.id });
    await em.flush();
  });
}
