import type { EntityManager } from "@mikro-orm/postgresql";
import { recordNumber } from "#app/lib/record-number.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { raiseEvent } from "../webhooks/raise-event.server.ts";
import { announce } from "../mail/announce.server.ts";
import { peopleOf } from "../people/people-of.server.ts";
import type { FoundIncident } from "./find-incident.server.ts";

/** Tells the people of the program what happened at which step; technicians only where somebody was in danger or a wafer was lost. */
export async function tellOfIncident(em: EntityManager, { actor }: ActorScope, incident: FoundIncident): Promise<void> {
  const named = recordNumber("incident", incident.program.slug, incident.number);
  const { id, program, lot, kind, severity, words } = incident;
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
      what: `${named}, ${kind}, ${severity}. ${words}`.trim(),
    },
    key: id,
    to: to.map((person) => person.id),
    by: actor.id,
  });
  await raiseEvent(em, {
    program: { id: program.id, slug: program.slug, name: program.name },
    event: "incident.reported",
    key: id,
    about: named,
    by: actor.id,
    data: {
      incident_id: id,
      incident: named,
      kind,
      severity,
      lot_id: lot.id,
      lot: lot.name,
      step: incident.step,
      step_title: incident.stepTitle,
    },
  });
}
