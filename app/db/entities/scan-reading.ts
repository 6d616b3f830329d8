import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { ReadingSettings, ScanReadingResult } from "#app/schemas/scan-reading.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { ScanFile } from "./scan-file.ts";

/** What a stored file says when it is read in one way. The same file read in the same way is read once. */
export const ScanReading = defineEntity({
  name: "ScanReading",
  tableName: "scan_reading",
  uniques: [{ properties: ["file", "settingsHash"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    file: () => p.manyToOne(ScanFile),
    settings: p.json<ReadingSettings>(),
    /** SHA-256 of the settings, hex */
    settingsHash: p.text(),
    result: p.json<ScanReadingResult>().lazy(),
    engineVersion: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type ScanReading = InferEntity<typeof ScanReading>;
