import type { EntityManager } from "@mikro-orm/postgresql";
import { IncidentNote } from "#app/db/entities/incident-note.ts";
import { IncidentPhoto } from "#app/db/entities/incident-photo.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { IncidentView } from "#app/schemas/incident.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findIncident } from "./find-incident.server.ts";

/**
 * All that is known of an incident.
 * @throws 404 for one that is not there or of a foreign program
 */
export async function incidentPage(scope: ActorScope, id: string | undefined): Promise<IncidentView> {
  return inScope(scope, async (em) => {
    const incident = await findIncident(em, scope, id);
    const { program, assessment, lot, wafer, radius, azimuth } = incident;
    return {
      id: incident.id,
      number: recordNumber("incident", program.slug, incident.number),
      program: program.name,
      assessment: {
        id: assessment.id,
        number: recordNumber("assessment", program.slug, assessment.documentNumber),
        flow: assessment.flowName,
        lot: assessment.lot?.name ?? null,
      },
      step: incident.step,
      lot: { id: lot.id, name: lot.name },
      wafer: wafer ? { id: wafer.id, name: wafer.name } : null,
      kind: incident.kind,
      severity: incident.severity,
      spot: typeof radius === "number" && typeof azimuth === "number" ? { radius, azimuth } : null,
      affected: incident.affected,
      broken: incident.broken,
      through: incident.through ?? null,
      words: incident.words,
      occurredAt: incident.occurredAt.toISOString(),
      reportedAt: incident.createdAt.toISOString(),
      reportedBy: incident.createdBy.name,
      state: incident.state,
      prediction: {
        stepKind: incident.stepKind,
        stepTitle: incident.stepTitle,
        silicon: incident.silicon,
        planned: incident.planned,
        required: incident.required,
        warp: incident.warp ?? null,
        warpUncertainty: incident.warpUncertainty ?? null,
        films: incident.films,
      },
      notes: await notesOf(em, incident.id),
      photos: await photosOf(em, incident.id),
      mayReport: mayInProgram(scope.actor, "report incidents", program.id),
      mayFollowUp: mayInProgram(scope.actor, "follow up incidents", program.id),
    };
  });
}

async function notesOf(em: EntityManager, incident: string): Promise<IncidentView["notes"]> {
  const notes = await em.find(
    IncidentNote,
    { incident },
    { populate: ["createdBy"], orderBy: { createdAt: "asc", id: "asc" } },
  );
  return notes.map(({ id, state, text, createdAt, createdBy }) => ({
    id,
    state,
    text,
    at: createdAt.toISOString(),
    by: createdBy.name,
  }));
}

async function photosOf(em: EntityManager, incident: string): Promise<IncidentView["photos"]> {
  const photos = await em.find(
    IncidentPhoto,
    { incident },
    { populate: ["createdBy"], orderBy: { createdAt: "asc", id: "asc" } },
  );
  return photos.map(({ id, width, height, size, createdAt, createdBy }) => ({
    id,
    width,
    height,
    size,
    addedAt: createdAt.toISOString(),
    addedBy: createdBy.name,
  }));
}
