import { createHash, randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { readOneProfile } from "#app/lib/scan-reading/one-profile.ts";
import { scanResult } from "#app/services/scan-result-of.ts";
import { Film } from "../entities/film.ts";
import type { Person } from "../entities/person.ts";
import { Program } from "../entities/program.ts";
import { ScanFile } from "../entities/scan-file.ts";
import { Scan } from "../entities/scan.ts";
import { MONITOR_PARAMETERS, monitorProfile, profileCsv } from "./demo-monitor.ts";

/** Makes the noise of this monitor its own. */
const SEED = 388;
const LABEL = "M-0388";

/** A monitor of Tern with Polymer dielectric A, scanned before and after the film, as the person would have uploaded it. */
export async function addDemoScan(em: EntityManager, person: Person): Promise<void> {
  const program = await em.findOneOrFail(Program, { slug: "tern" });
  const film = await em.findOneOrFail(Film, { name: "Polymer dielectric A" });
  const about = { program, createdAt: new Date(), createdBy: person };
  const scanned = (which: "before" | "after") => {
    const name = `${LABEL.toLowerCase()}-${which}.csv`;
    const bytes = Buffer.from(profileCsv(monitorProfile(which, { seed: SEED })));
    const hash = createHash("sha256").update(bytes).digest("hex");
    const file = em.create(ScanFile, { id: randomUUID(), name, hash, size: bytes.length, bytes, ...about });
    return { file, profile: readOneProfile(bytes, name, MONITOR_PARAMETERS) };
  };
  const [before, after] = [scanned("before"), scanned("after")];
  const values = { program: program.id, label: LABEL, film: film.id, ...MONITOR_PARAMETERS };
  em.create(Scan, {
    id: randomUUID(),
    label: LABEL,
    film,
    before: before.file,
    after: after.file,
    parameters: MONITOR_PARAMETERS,
    result: scanResult(values, before.profile, after.profile),
    engineVersion: ENGINE_VERSION,
    ...about,
  });
}
