import type { EntityManager } from "@mikro-orm/postgresql";
import { recordNumber } from "#app/lib/record-number.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { announce } from "../mail/announce.server.ts";
import { peopleOf } from "../people/people-of.server.ts";
import type { FoundIncident } from "./find-incident.server.ts";

/** Tells the people of the program what happened at which step; technicians only where somebody was in danger or a wafer was lost. */
export async function tellOfIncident(em: EntityManager, { actor }: ActorScope, incident: FoundIncident): Promise<void> {
  const { id, program, lot, number, kind, severity, words } = incident;
  const everybody = severity === "wafer lost" || severity === "danger to people";
  const to = (await peopleOf(em, program.id)).filter(({ role }) => everybody || role !== "technician");
  await announce(em, {
    program: program.id,
    announcement: {
      kind: "incident",
      program: program.name,
      by: actor.name,
      path: `/incidents/${id}`,
      lot: lot.name,
      step: `step ${incident.step}, ${incident.stepTitle}`,
      what: `${recordNumber("incident", program.slug, number)}, ${kind}, ${severity}. ${words}`.trim(),
    },
    key: id,
    to: to.map((person) => person.id),
    by: actor.id,
  });
}
