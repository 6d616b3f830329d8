import { createHash, randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import { contentByWafer } from "#app/lib/table-by-wafer.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { settingsHash } from "#app/services/scan-readings/settings-hash.ts";
import { Lot } from "../entities/lot.ts";
import type { Person } from "../entities/person.ts";
import { Program } from "../entities/program.ts";
import { ScanFile } from "../entities/scan-file.ts";
import { ScanReading } from "../entities/scan-reading.ts";
import { Wafer } from "../entities/wafer.ts";
import { WaferMeasurement } from "../entities/wafer-measurement.ts";

const LOT = "T-0412";
const FILE = "lot-T-0412-incoming.csv";
const MEASURED: ImportProfile["measured"] = { sideUp: "device", support: "three points", gravity: "compensated" };

/** A whole number from −5 to 5 that goes up and down from slot to slot as a lot does. */
const wander = (slot: number, step: number) => ((slot * step) % 11) - 5;

/** The incoming inspection of a lot, as its gauge would write it. */
function summaryCsv(): string {
  const rows = Array.from({ length: 25 }, (_, n) => {
    const slot = n + 1;
    const bow = -88 + 2.6 * wander(slot, 37) - 0.4 * slot;
    const figures = [
      bow,
      Math.abs(bow) + 14 + wander(slot, 23),
      724.6 + 0.2 * wander(slot, 19),
      2.4 + 0.15 * wander(slot, 29),
    ];
    return [LOT, slot, `T0412-${String(slot).padStart(2, "0")}`, ...figures.map((value) => value.toFixed(2))].join(",");
  });
  return ["Lot,Slot,Wafer,Bow_3pt_EE3 (µm),Warp_bf_EE3 (µm),Thk_ctr (µm),TTV (µm)", ...rows, ""].join("\n");
}

/** A lot of Tern as it came in, brought in as the person would have imported its summary. */
export async function addDemoLot(em: EntityManager, person: Person): Promise<void> {
  const program = await em.findOneOrFail(Program, { slug: "tern" });
  const about = { program, createdAt: new Date(), createdBy: person };
  const bytes = Buffer.from(summaryCsv());
  const hash = createHash("sha256").update(bytes).digest("hex");
  const file = em.create(ScanFile, { id: randomUUID(), name: FILE, hash, size: bytes.length, bytes, ...about });
  const settings = { profile: { measured: MEASURED }, edgeExclusion: 5e-3 };
  const result = readingFigures(FILE, readScanFile(bytes, FILE, settings.profile), settings.edgeExclusion);
  const reading = em.create(ScanReading, {
    id: randomUUID(),
    file,
    settings,
    settingsHash: settingsHash(settings),
    result,
    engineVersion: ENGINE_VERSION,
    ...about,
  });
  const lot = em.create(Lot, { id: randomUUID(), name: LOT, note: "As it came in, before the dielectric.", ...about });
  for (const { named, content } of contentByWafer(result.content, { lot: LOT, wafer: "", slot: null })) {
    const wafer = em.create(Wafer, { id: randomUUID(), lot, slot: named.slot, name: named.wafer, ...about });
    em.create(WaferMeasurement, { id: randomUUID(), wafer, reading, kind: content.kind, content, ...about });
  }
}
