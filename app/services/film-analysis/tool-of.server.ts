import type { EntityManager } from "@mikro-orm/postgresql";
import type { ImportProfile } from "#app/db/entities/import-profile.ts";
import { ReferenceReading } from "#app/db/entities/reference-reading.ts";
import { referenceCheck } from "#app/engine/profile/tool/repeatability.ts";
import type { KnownTool } from "#app/lib/film-analysis/pair-points.ts";
import { checkInput } from "#app/lib/reference-summary.ts";
import { bowOfCurvature, curvatureOfBow } from "#app/lib/study-readings.ts";
import { studyInUse } from "../instruments/instrument-of.server.ts";

/** What budgets know of an instrument: its newest study that counts, and what it reads on the wafer of known bow read last. */
export async function toolOf(em: EntityManager, { id, name }: ImportProfile): Promise<KnownTool> {
  const study = await studyInUse(em, id);
  if (!study) return { name, repeatability: null, forTwo: null, offset: null };
  const { standardUncertainty, degreesOfFreedom, forTwo } = study.result;
  return {
    name,
    repeatability: { standardUncertainty, degreesOfFreedom },
    forTwo,
    offset: await offsetOf(em, id, forTwo),
  };
}

/** By how much its curvatures may be off, 1/m: what it reads beside the known bow together with the uncertainty of that. */
async function offsetOf(em: EntityManager, profile: string, forTwo: number): Promise<KnownTool["offset"]> {
  const readings = await em.find(
    ReferenceReading,
    { profile, setAside: null },
    { populate: ["wafer"], orderBy: { measuredOn: "desc", createdAt: "desc" } },
  );
  const [newest] = readings;
  if (!newest) return null;
  const { wafer } = newest;
  const own = readings
    .filter((reading) => reading.wafer.id === wafer.id)
    .map(({ measuredOn, bow }) => ({ measuredOn, bow, setAside: null }));
  const input = checkInput(wafer, own, bowOfCurvature(forTwo, wafer.diameter));
  if (!input) return null;
  const { bias, biasUncertainty } = referenceCheck(input);
  return { standardUncertainty: Math.abs(curvatureOfBow(Math.hypot(bias, biasUncertainty), wafer.diameter)) };
}
