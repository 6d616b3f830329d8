import { randomUUID } from "node:crypto";
import { DriverException, UniqueConstraintViolationException } from "@mikro-orm/core";
import type { EntityManager } from "@mikro-orm/postgresql";
import { AuditEvent } from "#app/db/entities/audit-event.ts";
import { Membership } from "#app/db/entities/membership.ts";
import { Program } from "#app/db/entities/program.ts";
import type { DemoForm } from "#app/schemas/demo-form.ts";
import { CONFIRM_WORD, type DemoHere, type DemoRemoved } from "#app/schemas/demo.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { demoAsItIs } from "./demo-view.server.ts";
import { waitForTheDemo } from "./load-demo.server.ts";

/** PostgreSQL's code for what is in use; `remove_demo` says so of work under way. */
const IN_USE = "55006";

type Asked = Pick<DemoForm, "confirm" | "seen" | "name" | "diameter">;

const refused = (sentence: string, field?: "confirm" | "name"): DemoRemoved => ({
  outcome: "refused",
  sentence,
  ...(field && { field }),
});

const UNDER_WAY = "Work of the demo is under way. Wait until it has ended, or stop it under Work under way.";

/**
 * Takes the demo out in one transaction: its programs with all that is in them, and what of its library nothing else uses. Everybody
 * who would be left without a program keeps their role in a new, empty one.
 * @throws 403 for a role that may not, or who does not own the process of every program of the demo
 */
export async function removeTheDemo(scope: ActorScope, asked: Asked): Promise<DemoRemoved> {
  requireOnSite(scope, "load and remove the demo");
  if (asked.confirm.toLowerCase() !== CONFIRM_WORD)
    return refused(`Nothing was removed: type the word ${CONFIRM_WORD} to say that you mean it.`, "confirm");
  try {
    return await inScope({ ...scope, atTheDemo: true }, async (em) => {
      await waitForTheDemo(em);
      const view = await demoAsItIs(em, scope);
      if (view.state === "absent") return { outcome: "gone" };
      if (view.state === "not yours")
        throw problem(403, "Only somebody who is process owner of every program of the demo may remove it.");
      const no = refusalOf(view, asked);
      if (no) return no;
      if (view.stranded.length > 0) await keepRoles(em, view.stranded, asked);
      await em.execute("select remove_demo()");
      noteRemoval(em, scope, view);
      await em.flush();
      return { outcome: "removed" };
    });
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException)
      return refused("Nothing was removed: there is a program of that name already. Give the new one another.", "name");
    if (error instanceof DriverException && error.code === IN_USE) return refused(UNDER_WAY);
    throw error;
  }
}

function refusalOf(view: DemoHere, { seen, name }: Asked): DemoRemoved | null {
  if (view.jobs > 0) return refused(UNDER_WAY);
  if (seen !== view.seen)
    return refused(
      "Nothing was removed: what would go has changed since you looked. See below what goes now, and send it again.",
    );
  if (view.stranded.length > 0 && name === "")
    return refused("Nothing was removed: name the program in which everybody keeps their role.", "name");
  return null;
}

/** A program for who would have none, so that nobody signs in to nothing. */
async function keepRoles(
  em: EntityManager,
  stranded: DemoHere["stranded"],
  { name, diameter }: Pick<Asked, "name" | "diameter">,
): Promise<void> {
  const createdAt = new Date();
  const program = em.create(Program, {
    id: randomUUID(),
    name,
    slug: slugOf(name),
    diameter: Number(diameter) / 1e3,
    purpose: "",
    createdAt,
  });
  for (const { id: person, role } of stranded)
    em.create(Membership, { id: randomUUID(), person, program, role, createdAt });
  await em.flush();
}

/** A name as it stands in addresses. */
function slugOf(name: string): string {
  const plain = name
    .normalize("NFKD")
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, "-");
  return plain.replaceAll(/^-|-$/g, "") || `program-${randomUUID().slice(0, 8)}`;
}

/** One event for all of it: the rows that went are told by their counts, what was done to them before stays in the trail. */
function noteRemoval(em: EntityManager, { actor, requestId }: ActorScope, { programs, goes }: DemoHere): void {
  em.create(AuditEvent, {
    id: randomUUID(),
    at: new Date(),
    actorId: actor.id,
    programId: null,
    action: "removed",
    subject: "demo",
    subjectId: null,
    field: null,
    from: { names: programs, ...Object.fromEntries(goes.map(({ kind, total }) => [kind, total])) },
    to: null,
    requestId,
  });
}
