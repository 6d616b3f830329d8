import { defineEntity, p, type InferEntity, type Opt } from "@mikro-orm/core";
import type { ScanParameters, ScanResult } from "#app/schemas/scan-result.ts";
import { Film } from "./film.ts";
import { ImportProfile } from "./import-profile.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { ScanFile } from "./scan-file.ts";
import { Wafer } from "./wafer.ts";
import { WaferScan } from "./wafer-scan.ts";

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
    /** null for a pair that was uploaded without a wafer */
    wafer: () => p.manyToOne(Wafer).nullable().deleteRule("restrict").index(),
    /** of the scans' x axis from the notch, counter-clockwise seen on the device side, rad; null where nobody has said */
    azimuth: p.double().nullable(),
    /** null for an instrument without an import profile of its own, and after that was removed */
    instrument: () => p.manyToOne(ImportProfile).nullable().deleteRule("set null"),
    /** the instrument as it was called when the files came; nothing where nobody said */
    instrumentName: p.text().default(""),
    /** the placed scans that it was made of; null for a pair that was uploaded without a wafer */
    beforeScan: () => p.manyToOne(WaferScan).nullable().deleteRule("restrict").index(),
    afterScan: () => p.manyToOne(WaferScan).nullable().deleteRule("restrict").index(),
    parameters: p.json<ScanParameters>(),
    result: p.json<ScanResult>().lazy(),
    /** figures of the result that lists show and sort by, without its curves: Pa, Pa and m */
    stress: p
      .double()
      .$type<Opt<number>>()
      .formula((table) => `(${table.alias}.result->>'stress')::double precision`),
    stressUncertainty: p
      .double()
      .$type<Opt<number>>()
      .formula((table) => `(${table.alias}.result->>'stressUncertainty')::double precision`),
    bowChange: p
      .double()
      .$type<Opt<number>>()
      .formula((table) => `(${table.alias}.result->>'bowChange')::double precision`),
    bowUncertainty: p
      .double()
      .$type<Opt<number>>()
      .formula((table) => `(${table.alias}.result->>'bowUncertainty')::double precision`),
    curled: p
      .boolean()
      .$type<Opt<boolean>>()
      .formula((table) => `(${table.alias}.result->'curled' <> 'null'::jsonb)`),
    engineVersion: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type Scan = InferEntity<typeof Scan>;
