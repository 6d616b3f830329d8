import { randomUUID } from "node:crypto";
import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { IncidentPhoto } from "#app/db/entities/incident-photo.ts";
import { MOST_PHOTOS } from "#app/schemas/incident-photo.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { findIncident, type FoundIncident } from "./find-incident.server.ts";
import { readPhoto, type ReadPhoto } from "./read-photo.server.ts";

/** Reads pictures before anything is stored; of those that are refused, why, a sentence each. */
export async function readPhotos(files: readonly UploadedFile[]): Promise<{ photos: ReadPhoto[]; refused: string[] }> {
  const [photos, refused]: [ReadPhoto[], string[]] = [[], []];
  if (files.length > MOST_PHOTOS) return { photos, refused: [tooMany(files.length)] };
  for (const file of files) {
    const read = await readPhoto(file);
    if ("refused" in read) refused.push(read.refused);
    else photos.push(read);
  }
  return { photos, refused };
}

const tooMany = (count: number) =>
  `These would be ${count} photos: an incident has up to ${MOST_PHOTOS}. Choose those that show most.`;

/** Puts pictures beside an incident; the same one again is passed over. */
export function putPhotos(
  em: EntityManager,
  scope: ActorScope,
  { id, program }: Pick<FoundIncident, "id" | "program">,
  photos: readonly ReadPhoto[],
): void {
  const different = [...new Map(photos.map((photo) => [photo.sha256, photo])).values()];
  for (const { bytes, ...photo } of different)
    em.create(IncidentPhoto, {
      id: randomUUID(),
      program: program.id,
      incident: id,
      ...photo,
      size: bytes.length,
      bytes: Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength),
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
}

/**
 * Adds pictures to an incident that is not closed. Sentences say what is wrong with them; nothing is stored then.
 * @throws 403 for a role that may not, 404 for an incident that is not the person's own
 */
export async function addPhotos(
  scope: ActorScope,
  incidentId: string | undefined,
  files: readonly UploadedFile[],
): Promise<string[]> {
  await inScope(scope, (em) => reportable(em, scope, incidentId));
  if (files.length === 0) return ["Choose a photo first."];
  const { photos, refused } = await readPhotos(files);
  if (refused.length > 0) return refused;
  return inScope(scope, async (em) => {
    const incident = await reportable(em, scope, incidentId);
    if (incident.state === "closed") return ["This incident is closed. Open it again with a note to add photos."];
    await em.lock(incident, LockMode.PESSIMISTIC_WRITE);
    const there = await em.find(IncidentPhoto, { incident: incident.id }, { fields: ["sha256"] });
    const fresh = photos.filter(({ sha256 }) => !there.some((photo) => photo.sha256 === sha256));
    if (there.length + fresh.length > MOST_PHOTOS) return [tooMany(there.length + fresh.length)];
    putPhotos(em, scope, incident, fresh);
    await em.flush();
    return [];
  });
}

async function reportable(em: EntityManager, scope: ActorScope, id: string | undefined): Promise<FoundIncident> {
  const incident = await findIncident(em, scope, id);
  requireInProgram(scope, "report incidents", incident.program.id, "incident");
  return incident;
}

/**
 * The bytes of a picture.
 * @throws 404 for one that is not there, not of that incident, or of a foreign program
 */
export async function photoFile(scope: ActorScope, incidentId: string | undefined, photoId: string | undefined) {
  return inScope(scope, async (em) => {
    const incident = await findIncident(em, scope, incidentId);
    const photo = await em.findOne(
      IncidentPhoto,
      { id: idFrom(photoId, "photo"), incident: incident.id },
      { populate: ["bytes"] },
    );
    if (!photo) throw notFound("photo");
    return { type: photo.type, sha256: photo.sha256, bytes: new Uint8Array(photo.bytes.$) };
  });
}
