import type { EntityManager } from "@mikro-orm/postgresql";
import type { ActorScope } from "#app/server/scope.server.ts";
import { raiseEvent } from "../webhooks/raise-event.server.ts";
import { announce } from "../mail/announce.server.ts";
import { peopleOf } from "../people/people-of.server.ts";

interface Held {
  id: string;
  lot: { id: string; name: string };
  program: { id: string; name: string; slug: string };
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
  step: { number: number; title: string };
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
      step: `${step.number}, ${step.title}`,
      reason,
    },
    key: id,
    to: await staffOf(em, program.id),
    by: scope.actor.id,
  });
  await raiseEvent(em, {
    program: { id: program.id, slug: program.slug, name: program.name },
    event: "step.stopped",
    key: id,
    about: `Step ${step.number}, ${step.title}`,
    by: scope.actor.id,
    data: { stop_id: id, lot_id: lot.id, lot: lot.name, flow, step: step.number, step_title: step.title },
  });
}

/** Guests are passed over by the announcement itself: they may not open the page. */
const staffOf = async (em: EntityManager, program: string) => (await peopleOf(em, program)).map(({ id }) => id);
