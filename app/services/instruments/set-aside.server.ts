import { ReferenceReading } from "#app/db/entities/reference-reading.ts";
import { RepeatabilityStudy } from "#app/db/entities/repeatability-study.ts";
import type { SetAsideValues } from "#app/schemas/instrument.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { instrumentOf } from "./instrument-of.server.ts";

/**
 * Sets a study or a reading of a reference wafer aside with its reason: it stays to be seen and counts no longer. One that is set
 * aside already keeps its first reason.
 * @throws 403 for a role that may not, 404 when it is none of this instrument's
 */
export async function setAside(
  scope: ActorScope,
  instrument: string | undefined,
  { what, id, reason }: SetAsideValues,
): Promise<void> {
  requireOnSite(scope, "check instruments");
  await inScope(scope, async (em) => {
    const { id: profile } = await instrumentOf(em, instrument);
    const found =
      what === "study"
        ? await em.findOne(RepeatabilityStudy, { id, profile })
        : await em.findOne(ReferenceReading, { id, profile });
    if (!found) throw notFound(what === "study" ? "repeatability study" : "reading");
    found.setAside ??= reason;
    await em.flush();
  });
}
