import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { ScanReading } from "#app/db/entities/scan-reading.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import type { ReadingSettings, ScanReadingResult } from "#app/schemas/scan-reading.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { sha256 } from "../scan-files.server.ts";

/** What tells two ways of reading a file apart, whatever the order in which they were written down. */
export function settingsHash(settings: ReadingSettings): string {
  return sha256(JSON.stringify(settings, sorted));
}

function sorted(_key: string, value: unknown): unknown {
  if (typeof value !== "object" || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(Object.entries(value).toSorted(([one], [other]) => (one < other ? -1 : 1)));
}

/** The id of the reading of a file in one way; null when it has not been read in that way. */
export async function knownReading(
  em: EntityManager,
  fileId: string,
  settings: ReadingSettings,
): Promise<string | null> {
  const known = await em.findOne(ScanReading, { file: fileId, settingsHash: settingsHash(settings) });
  return known?.id ?? null;
}

/** Stores what a file says. */
export async function keepReading(
  em: EntityManager,
  scope: ActorScope,
  {
    program,
    file,
    settings,
    result,
  }: { program: string; file: string; settings: ReadingSettings; result: ScanReadingResult },
): Promise<string> {
  const { id } = em.create(ScanReading, {
    id: randomUUID(),
    program,
    file,
    settings,
    settingsHash: settingsHash(settings),
    result,
    engineVersion: ENGINE_VERSION,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
  await em.flush();
  return id;
}
