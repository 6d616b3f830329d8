import { createHash, randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { curvatureAlong } from "#app/engine/profile/azimuths.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { readOneProfile } from "#app/lib/scan-reading/one-profile.ts";
import { scanResult } from "#app/services/scan-result-of.ts";
import { Film } from "../entities/film.ts";
import { ImportProfile } from "../entities/import-profile.ts";
import { Lot } from "../entities/lot.ts";
import type { Person } from "../entities/person.ts";
import { Program } from "../entities/program.ts";
import { Scan } from "../entities/scan.ts";
import { ScanFile } from "../entities/scan-file.ts";
import { Wafer } from "../entities/wafer.ts";
import { DEMO_INSTRUMENT } from "./demo-instrument.ts";
import { FILM_CURVATURE, MONITOR_PARAMETERS, monitorProfile, profileCsv } from "./demo-monitor.ts";

const NAME = "M-0412";
const DAY = 86_400_000;
const LINES = [0, 45, 90, 135];
/** What the wafer and its film bend, 1/m: it pulls 8 % more towards the notch than across. Invented. */
const BEFORE = { x: 0.0011, y: 0.0004, twist: 0.0001 };
const CHANGE = { x: 1.04 * FILM_CURVATURE, y: 0.96 * FILM_CURVATURE, twist: 0.01 * FILM_CURVATURE };

/** A monitor of Tern scanned along four lines before and after its film, so that its shape is told all over. */
export async function addDemoWafer(em: EntityManager, person: Person): Promise<void> {
  const program = await em.findOneOrFail(Program, { slug: "tern" });
  const film = await em.findOneOrFail(Film, { name: "Polymer dielectric A" });
  const instrument = await em.findOneOrFail(ImportProfile, { name: DEMO_INSTRUMENT });
  const about = { program, createdAt: new Date(Date.now() - DAY), createdBy: person };
  const lot = em.create(Lot, { id: randomUUID(), name: "T-2611", note: "", ...about });
  const wafer = em.create(Wafer, { id: randomUUID(), lot, slot: 3, name: NAME, ...about });
  for (const degrees of LINES) {
    const azimuth = (degrees * Math.PI) / 180;
    const scanned = (which: "before" | "after") => {
      const name = `${NAME.toLowerCase()}-${degrees}-${which}.csv`;
      const bytes = Buffer.from(profileCsv(profileAlong(azimuth, which, 400 + degrees)));
      const hash = createHash("sha256").update(bytes).digest("hex");
      const file = em.create(ScanFile, { id: randomUUID(), name, hash, size: bytes.length, bytes, ...about });
      return { file, profile: readOneProfile(bytes, name, MONITOR_PARAMETERS) };
    };
    const [before, after] = [scanned("before"), scanned("after")];
    const label = `${NAME}, lot T-2611, slot 3, ${degrees}°`;
    const values = { program: program.id, label, film: film.id, ...MONITOR_PARAMETERS };
    em.create(Scan, {
      id: randomUUID(),
      label,
      film,
      before: before.file,
      after: after.file,
      wafer,
      azimuth,
      instrument,
      instrumentName: instrument.name,
      parameters: MONITOR_PARAMETERS,
      result: scanResult(values, before.profile, after.profile),
      engineVersion: ENGINE_VERSION,
      ...about,
    });
  }
}

/** Noise and tilt of a monitor's scan, bent as this wafer is along the line. */
function profileAlong(azimuth: number, which: "before" | "after", seed: number) {
  const bend = curvatureAlong(BEFORE, azimuth) + (which === "after" ? curvatureAlong(CHANGE, azimuth) : 0);
  const [noisy, bare] = [monitorProfile(which, { seed }), monitorProfile(which, { seed, noise: 0 })];
  return noisy.map(({ x, z }, n) => ({ x, z: z - (bare[n]?.z ?? 0) + (bend * x * x) / 2 + 20e-6 * x }));
}
