import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { WaferMeasurementContent } from "#app/schemas/wafer.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { ScanReading } from "./scan-reading.ts";
import { Wafer } from "./wafer.ts";

/** What a table of an instrument says of one wafer: its row of a summary, its map, its reduced stresses. */
export const WaferMeasurement = defineEntity({
  name: "WaferMeasurement",
  tableName: "wafer_measurement",
  uniques: [{ properties: ["reading", "wafer"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    wafer: () => p.manyToOne(Wafer).index(),
    reading: () => p.manyToOne(ScanReading),
    kind: p.text().$type<WaferMeasurementContent["kind"]>(),
    content: p.json<WaferMeasurementContent>(),
    /** the day that the file gives */
    measuredAt: p.datetime().nullable(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type WaferMeasurement = InferEntity<typeof WaferMeasurement>;
