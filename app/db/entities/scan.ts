import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { ScanParameters, ScanResult } from "#app/schemas/scan-result.ts";
import { Film } from "./film.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { ScanFile } from "./scan-file.ts";

/** One film measured by a profile before it and one after it. */
export const Scan = defineEntity({
  name: "Scan",
  tableName: "scan",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    label: p.text(),
    film: () => p.manyToOne(Film).nullable(),
    before: () => p.manyToOne(ScanFile),
    after: () => p.manyToOne(ScanFile),
    parameters: p.json<ScanParameters>(),
    result: p.json<ScanResult>(),
    engineVersion: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type Scan = InferEntity<typeof Scan>;
