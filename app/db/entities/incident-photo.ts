import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { PhotoType } from "#app/schemas/incident-photo.ts";
import { Incident } from "./incident.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** A picture of an incident, drawn anew without anything that the camera wrote beside it. Only added. */
export const IncidentPhoto = defineEntity({
  name: "IncidentPhoto",
  tableName: "incident_photo",
  uniques: [{ properties: ["incident", "sha256"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    incident: () => p.manyToOne(Incident),
    type: p.text().$type<PhotoType>(),
    width: p.integer(),
    height: p.integer(),
    size: p.integer(),
    sha256: p.text(),
    bytes: p.blob().lazy(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type IncidentPhoto = InferEntity<typeof IncidentPhoto>;
