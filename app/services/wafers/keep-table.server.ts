import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { ScanReading } from "#app/db/entities/scan-reading.ts";
import type { Wafer } from "#app/db/entities/wafer.ts";
import { WaferMeasurement } from "#app/db/entities/wafer-measurement.ts";
import { contentByWafer, type NamedContent } from "#app/lib/table-by-wafer.ts";
import type { KeptFile, TableFileValues } from "#app/schemas/scan-import.ts";
import type { ScanReadingResult } from "#app/schemas/scan-reading.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { findOrMakeWafer } from "./find-wafer.server.ts";
import { ImportRefused } from "./import-refused.ts";
import { measuredAt } from "./place-profiles.server.ts";

/**
 * Keeps what a table says, wafer by wafer, within a transaction that is open already. A table that was brought in before is not kept
 * twice, however it was read.
 * @throws ImportRefused when a row cannot be told to be of a wafer: then no row is kept
 */
export async function keepTable(
  em: EntityManager,
  scope: ActorScope,
  values: TableFileValues,
  reading: ScanReading,
  result: ScanReadingResult,
): Promise<KeptFile> {
  const [known] = await em.find(
    WaferMeasurement,
    { reading: { file: reading.file.id } },
    { populate: ["createdBy"], orderBy: { createdAt: "asc" }, limit: 1 },
  );
  if (known) {
    const before = { by: known.createdBy.name, at: known.createdAt.toISOString() };
    return { outcome: "known table", reading: known.reading.id, before };
  }
  const wafers = new Map<string, Wafer>();
  for (const { named, content } of contentByWafer(result.content, values)) {
    const wafer = await findOrMakeWafer(em, scope, values.program, named);
    if (wafers.has(wafer.id)) throw twice(named);
    wafers.set(wafer.id, wafer);
    em.create(WaferMeasurement, {
      id: randomUUID(),
      program: values.program,
      wafer,
      reading,
      kind: content.kind,
      content,
      measuredAt: measuredAt(result),
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
  }
  await em.flush();
  const lots = new Map([...wafers.values()].flatMap(({ lot }) => (lot ? [[lot.id, lot.name] as const] : [])));
  return {
    outcome: "measured",
    reading: reading.id,
    kind: result.content.kind,
    wafers: wafers.size,
    only: wafers.size === 1 ? ([...wafers.keys()][0] ?? null) : null,
    lots: [...lots].map(([id, name]) => ({ id, name })),
  };
}

/** Two names in the table turn out to be one wafer, such as its slot in one row and its name in another. */
const twice = ({ wafer, slot }: NamedContent["named"]) =>
  new ImportRefused(
    `The table has two sets of rows for ${wafer === "" ? `slot ${slot}` : wafer}. Name each wafer in one way.`,
  );
