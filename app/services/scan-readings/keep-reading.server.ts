import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { ScanReading } from "#app/db/entities/scan-reading.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import type { ReadingSettings, ScanReadingResult } from "#app/schemas/scan-reading.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { settingsHash } from "./settings-hash.ts";

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
