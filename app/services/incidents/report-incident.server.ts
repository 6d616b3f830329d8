import { UniqueConstraintViolationException, type EntityManager } from "@mikro-orm/postgresql";
import { Incident } from "#app/db/entities/incident.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import { stepPrediction } from "#app/lib/step-prediction.ts";
import type { IncidentValues } from "#app/schemas/incident-form.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { findOrMakeLot, findOrMakeWafer } from "../wafers/find-wafer.server.ts";
import { ImportRefused } from "../wafers/import-refused.ts";
import { findIncident } from "./find-incident.server.ts";
import { putPhotos, readPhotos } from "./keep-photos.server.ts";
import type { ReadPhoto } from "./read-photo.server.ts";
import { tellOfIncident } from "./tell.server.ts";

/** What became of a report: stored, or what to change at which field. */
export type Reported =
  { outcome: "stored"; id: string } | { outcome: "refused"; field: "step" | "wafer" | "photos"; reasons: string[] };

/**
 * Stores an incident with its pictures beside what its assessment says of the step, and tells the people of the program, all of it or
 * nothing. A lot or wafer that is not known yet is made, so that nothing keeps anybody from reporting. One that was stored before is not
 * stored again.
 * @throws 403 for a role that may not, 404 for an assessment that is not the person's own
 */
export async function reportIncident(
  scope: ActorScope,
  values: IncidentValues,
  files: readonly UploadedFile[],
): Promise<Reported> {
  // Who may not report is told so before their pictures are read.
  await inScope(scope, (em) => reportableAssessment(em, scope, values.assessment));
  const { photos, refused } = await readPhotos(files);
  if (refused.length > 0) return { outcome: "refused", field: "photos", reasons: refused };
  try {
    return await keepReport(scope, values, photos);
  } catch (error) {
    if (error instanceof ImportRefused) return { outcome: "refused", field: "wafer", reasons: [error.message] };
    if (error instanceof UniqueConstraintViolationException) return keepAgain(scope, values, photos);
    throw error;
  }
}

/** Somebody made the same lot, wafer or report at the same moment: the second time finds it. */
async function keepAgain(...report: Parameters<typeof keepReport>): Promise<Reported> {
  try {
    return await keepReport(...report);
  } catch (error) {
    if (!(error instanceof UniqueConstraintViolationException)) throw error;
    throw problem(409, "Another report has this one’s own number. Open the form again and send it once more.");
  }
}

function keepReport(scope: ActorScope, values: IncidentValues, photos: readonly ReadPhoto[]): Promise<Reported> {
  return inScope(scope, async (em): Promise<Reported> => {
    const assessment = await reportableAssessment(em, scope, values.assessment);
    const { program, input, result } = assessment;
    const { id, leg, step, spot, lot: lotName, wafer: waferName, assessment: _, ...reported } = values;
    if (await em.findOne(Incident, { id, program, createdBy: scope.actor.id })) return { outcome: "stored", id };
    const prediction = stepPrediction(input.$, result, leg, step);
    if (!prediction)
      return {
        outcome: "refused",
        field: "step",
        reasons: [`The assessment has no step ${step} for these slots. Choose another step, or the other slots.`],
      };
    const { lot, wafer } = await placeOf(em, scope, program.id, lotName, waferName);
    em.create(Incident, {
      id,
      program: program.id,
      number: await nextNumber(em, program.id),
      assessment,
      leg,
      step,
      ...prediction,
      lot,
      wafer,
      ...reported,
      radius: spot?.radius ?? null,
      azimuth: spot?.azimuth ?? null,
      state: "open",
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
    const incident = await findIncident(em, scope, id);
    putPhotos(em, scope, incident, photos);
    await em.flush();
    await tellOfIncident(em, scope, incident);
    return { outcome: "stored", id };
  });
}

async function reportableAssessment(em: EntityManager, scope: ActorScope, id: string) {
  const assessment = await findAssessment(em, scope, id);
  requireInProgram(scope, "report incidents", assessment.program.id, "assessment");
  return assessment;
}

/** 'slot 7', or the number of a slot alone. */
const SLOT = /^(?:slot\s*)?(\d{1,2})$/i;

/** Lot and wafer as they are named, made where they are new. A number that names no wafer of the lot is its slot. */
async function placeOf(em: EntityManager, scope: ActorScope, program: string, lotName: string, waferName: string) {
  const lot = await findOrMakeLot(em, scope, program, lotName);
  await em.flush();
  if (waferName === "") return { lot, wafer: null };
  const known = await em.findOne(Wafer, { program, lot, name: { $ilike: escapeLike(waferName) } });
  if (known) return { lot, wafer: known };
  const [, slot] = SLOT.exec(waferName) ?? [];
  const named = slot ? { wafer: "", slot: Number(slot) } : { wafer: waferName, slot: null };
  return { lot, wafer: await findOrMakeWafer(em, scope, program, { lot: lot.name, ...named }) };
}

/** The number after the newest of the program. Two people who report at once wait for each other until the end. */
async function nextNumber(em: EntityManager, program: string): Promise<number> {
  await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`incident numbers of ${program}`]);
  const [newest] = await em.execute<{ number: number }[]>(
    "select coalesce(max(number), 0) as number from incident where program_id = ?",
    [program],
  );
  return (newest?.number ?? 0) + 1;
}
