import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { WaferScanSide, WaferScanSubject } from "#app/schemas/wafer.ts";
import { ImportProfile } from "./import-profile.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { ScanReading } from "./scan-reading.ts";
import { Wafer } from "./wafer.ts";

/** One profile of a file, placed on a wafer. It waits for its partner while no scan uses it. */
export const WaferScan = defineEntity({
  name: "WaferScan",
  tableName: "wafer_scan",
  uniques: [{ properties: ["reading", "profile", "wafer", "azimuth", "side"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    reading: () => p.manyToOne(ScanReading),
    /** which of the profiles of the file, from 0 */
    profile: p.integer(),
    wafer: () => p.manyToOne(Wafer).index(),
    /** of the scan's x axis from the notch, counter-clockwise seen on the device side, rad */
    azimuth: p.double(),
    side: p.text().$type<WaferScanSide>(),
    /** null for an instrument without an import profile of its own, and after that was removed */
    instrument: () => p.manyToOne(ImportProfile).nullable().deleteRule("set null"),
    /** the instrument as it was called when the file came; nothing where nobody said */
    instrumentName: p.text(),
    /** the day that the file gives */
    measuredAt: p.datetime().nullable(),
    subject: p.json<WaferScanSubject>(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type WaferScan = InferEntity<typeof WaferScan>;
