import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { curvatureOfBow } from "#app/lib/study-readings.ts";
import { studyResult } from "#app/lib/study-result.ts";
import { ImportProfile } from "../entities/import-profile.ts";
import type { Person } from "../entities/person.ts";
import { ReferenceReading } from "../entities/reference-reading.ts";
import { ReferenceWafer } from "../entities/reference-wafer.ts";
import { RepeatabilityStudy } from "../entities/repeatability-study.ts";

export const DEMO_INSTRUMENT = "Stylus 1";

const DIAMETER = 0.2;
const DAY = 86_400_000;
/** Standard bows, µm, of the monitor when it was put back ten times, and of the reference wafer week by week. Invented. */
const REPEATS = [-4.02, -3.87, -4.11, -3.95, -4.06, -3.9, -4.15, -3.98, -4.04, -3.92];
const WEEKS = [-45.12, -45.31, -45.05, -45.22, -45.4, -45.17, -45.35, -45.28];
const KNOWN = -45.2;

const REFERENCE = "R-07 of 2026";

/** The profilometer of the pilot line: how it repeats, and what it has read on a wafer of known bow. Those of their names stay as they are. */
export async function addDemoInstrument(em: EntityManager, person: Person): Promise<void> {
  if (await em.findOne(ImportProfile, { name: DEMO_INSTRUMENT })) return;
  const now = new Date();
  const made = { createdAt: now, createdBy: person };
  const profile = em.create(ImportProfile, {
    id: randomUUID(),
    name: DEMO_INSTRUMENT,
    profile: { delimiter: ",", decimalMark: "point", units: { position: "mm", height: "µm" } },
    ...made,
    updatedAt: now,
    updatedBy: person,
  });
  const readings = REPEATS.map((bow) => ({ curvature: curvatureOfBow(bow * 1e-6, DIAMETER), file: null }));
  em.create(RepeatabilityStudy, {
    id: randomUUID(),
    profile,
    instrument: DEMO_INSTRUMENT,
    wafer: "M-0388",
    diameter: DIAMETER,
    readings,
    result: studyResult(readings),
    note: "Taken off and put back ten times, bare monitor",
    setAside: null,
    engineVersion: ENGINE_VERSION,
    ...made,
  });
  const wafer =
    (await em.findOne(ReferenceWafer, { name: REFERENCE })) ??
    em.create(ReferenceWafer, {
      id: randomUUID(),
      name: REFERENCE,
      bow: KNOWN * 1e-6,
      bowUncertainty: 0.15e-6,
      diameter: DIAMETER,
      note: "Certificate of the site’s metrology room",
      ...made,
    });
  WEEKS.forEach((bow, week) =>
    em.create(ReferenceReading, {
      id: randomUUID(),
      profile,
      instrument: DEMO_INSTRUMENT,
      wafer,
      measuredOn: new Date(now.getTime() - 7 * DAY * (WEEKS.length - week)).toISOString().slice(0, 10),
      bow: bow * 1e-6,
      note: "",
      setAside: null,
      ...made,
    }),
  );
}
