import type { EntityManager } from "@mikro-orm/postgresql";
import { ImportProfile } from "#app/db/entities/import-profile.ts";
import { RepeatabilityStudy } from "#app/db/entities/repeatability-study.ts";
import { notFound } from "#app/server/problem.server.ts";
import { idFrom } from "../uuid.server.ts";

/** The record of an instrument. @throws 404 when the id names nothing */
export async function instrumentOf(em: EntityManager, id: string | undefined): Promise<ImportProfile> {
  const record = await em.findOne(ImportProfile, { id: idFrom(id, "instrument") });
  if (!record) throw notFound("instrument");
  return record;
}

/** The study whose uncertainty budgets use: the newest that counts. */
export async function studyInUse(em: EntityManager, instrument: string): Promise<RepeatabilityStudy | null> {
  return em.findOne(
    RepeatabilityStudy,
    { profile: instrument, setAside: null },
    { orderBy: { createdAt: "desc", id: "asc" } },
  );
}
