import { ReferenceReading } from "#app/db/entities/reference-reading.ts";
import type { ReferenceWafer } from "#app/db/entities/reference-wafer.ts";
import { RepeatabilityStudy } from "#app/db/entities/repeatability-study.ts";
import { controlLimitsWorking } from "#app/engine/profile/lot-figures/working.ts";
import { referenceCheckWorking, repeatabilityWorking } from "#app/engine/profile/tool/working.ts";
import { chartValues, checkInput, referenceSummary } from "#app/lib/reference-summary.ts";
import { shownWorking } from "#app/lib/shown-working.ts";
import { bowOfCurvature } from "#app/lib/study-readings.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import type {
  InstrumentDetail,
  ReferenceReadingView,
  ReferenceView,
  ReferenceWaferView,
  StudyView,
} from "#app/schemas/instrument.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { instrumentOf } from "./instrument-of.server.ts";

/**
 * An instrument with its repeatability studies, newest first, and with every wafer of known bow that was read on it.
 * @throws 403 for a role that may not, 404 when the id names nothing
 */
export async function getInstrument(scope: ActorScope, id: string | undefined): Promise<InstrumentDetail> {
  requireOnSite(scope, "see the library");
  return inScope(scope, async (em) => {
    const record = await instrumentOf(em, id);
    const of = { profile: record.id };
    const studies = (
      await em.find(RepeatabilityStudy, of, {
        populate: ["createdBy"],
        orderBy: { createdAt: "desc", id: "asc" },
      })
    ).map(studyView);
    const inUse = studies.find(({ setAside }) => setAside === null) ?? null;
    const readings = await em.find(ReferenceReading, of, {
      populate: ["createdBy", "wafer"],
      orderBy: { measuredOn: "asc", createdAt: "asc" },
    });
    return {
      id: record.id,
      name: record.name,
      mayCheck: mayOnSite(scope.actor, "check instruments"),
      profile: record.profile,
      studies,
      inUse: inUse?.id ?? null,
      references: byWafer(readings).map((all) => referenceView(all, inUse)),
    };
  });
}

function studyView(study: RepeatabilityStudy & { createdBy: { name: string } }): StudyView {
  const { id, wafer, diameter, readings, result, note, setAside, createdAt, createdBy } = study;
  return {
    id,
    wafer,
    diameter,
    readings,
    result,
    note,
    setAside: setAside ?? null,
    createdAt: createdAt.toISOString(),
    createdBy: createdBy.name,
    working: shownWorking(repeatabilityWorking([readings.map(({ curvature }) => curvature)], "1/m")),
  };
}

type Reading = ReferenceReading & { wafer: ReferenceWafer; createdBy: { name: string } };

function byWafer(readings: Reading[]): [Reading, ...Reading[]][] {
  const wafers = new Map<string, [Reading, ...Reading[]]>();
  for (const reading of readings) {
    const known = wafers.get(reading.wafer.id);
    if (known) known.push(reading);
    else wafers.set(reading.wafer.id, [reading]);
  }
  return [...wafers.values()].sort(([a], [b]) => a.wafer.name.localeCompare(b.wafer.name));
}

export function referenceWaferView({
  id,
  name,
  bow,
  bowUncertainty,
  diameter,
  note,
}: ReferenceWafer): ReferenceWaferView {
  return { id, name, bow, bowUncertainty, diameter, note };
}

function referenceView(all: [Reading, ...Reading[]], inUse: StudyView | null): ReferenceView {
  const wafer = referenceWaferView(all[0].wafer);
  const readings = all.map(({ id, measuredOn, bow, note, setAside, createdBy }): ReferenceReadingView => ({
    id,
    measuredOn,
    bow,
    note,
    setAside: setAside ?? null,
    createdBy: createdBy.name,
  }));
  const tool = inUse && bowOfCurvature(inUse.result.forTwo, wafer.diameter);
  const summary = referenceSummary(wafer, readings, tool);
  const input = checkInput(wafer, readings, tool);
  const workings = [
    ...(input ? [referenceCheckWorking(input, "m")] : []),
    ...(summary.limits ? [controlLimitsWorking(chartValues(wafer, readings), "m")] : []),
  ];
  return { wafer, readings, summary, workings: workings.map(shownWorking) };
}
