import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { IncidentState } from "#app/schemas/incident.ts";
import { Incident } from "./incident.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** What was found out or done about an incident, and the state that it has from then on. Only added. */
export const IncidentNote = defineEntity({
  name: "IncidentNote",
  tableName: "incident_note",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    incident: () => p.manyToOne(Incident).index(),
    state: p.text().$type<IncidentState>(),
    text: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type IncidentNote = InferEntity<typeof IncidentNote>;
