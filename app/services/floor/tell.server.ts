import type { EntityManager } from "@mikro-orm/postgresql";
import type { ActorScope } from "#app/server/scope.server.ts";
import { announce } from "../mail/announce.server.ts";
import { peopleOf } from "../people/people-of.server.ts";

interface Held {
  id: string;
  lot: { id: string; name: string };
  program: { id: string; name: string };
  reason: string;
}

/** Tells everybody who works in the program that a lot is held, and why. */
export async function tellOfHold(
  em: EntityManager,
  scope: ActorScope,
  { id, lot, program, reason }: Held,
): Promise<void> {
  await announce(em, {
    program: program.id,
    announcement: {
      kind: "lot held",
      program: program.name,
      by: scope.actor.name,
      path: `/lots/${lot.id}`,
      lot: lot.name,
      reason,
    },
    key: id,
    to: await staffOf(em, program.id),
    by: scope.actor.id,
  });
}

interface Stopped extends Held {
  flow: string;
  /** the step by number and title */
  step: string;
}

/** Tells everybody who works in the program that no lot may begin a step, and why. */
export async function tellOfStop(
  em: EntityManager,
  scope: ActorScope,
  { id, lot, program, reason, flow, step }: Stopped,
): Promise<void> {
  await announce(em, {
    program: program.id,
    announcement: {
      kind: "step stopped",
      program: program.name,
      by: scope.actor.name,
      path: `/lots/${lot.id}`,
      flow,
      step,
      reason,
    },
    key: id,
    to: await staffOf(em, program.id),
    by: scope.actor.id,
  });
}

/** Guests are passed over by the announcement itself: they may not open the page. */
const staffOf = async (em: EntityManager, program: string) => (await peopleOf(em, program)).map(({ id }) => id);
