import type { EntityManager } from "@mikro-orm/postgresql";
import { Scan } from "#app/db/entities/scan.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import { WaferMeasurement } from "#app/db/entities/wafer-measurement.ts";
import { WaferScan } from "#app/db/entities/wafer-scan.ts";
import { azimuthText } from "#app/lib/wafer-label.ts";
import { newestFigures, type DatedStress } from "#app/lib/wafer-figures.ts";
import type { LotDetail, LotTable, WaferMap } from "#app/schemas/lot-view.ts";
import { WAITING } from "./waiting-partner.server.ts";

/** The wafers of a lot by slot with what was measured of them, within a transaction that is open already. */
export async function lotWafers(
  em: EntityManager,
  lot: string,
): Promise<Pick<LotDetail, "wafers" | "tables" | "maps">> {
  const wafers = await em.find(
    Wafer,
    { lot },
    { orderBy: [{ slot: "asc nulls last" }, { name: "asc" }, { id: "asc" }] },
  );
  const of = { wafer: { $in: wafers.map(({ id }) => id) } };
  const newest = { orderBy: [{ createdAt: "desc" as const }, { id: "asc" as const }] };
  const measurements = await em.find(WaferMeasurement, of, { populate: ["reading.file", "createdBy"], ...newest });
  const scans = await em.find(Scan, of, newest);
  const waiting = await em.find(WaferScan, { ...of, id: { $in: await waitingOf(em, lot) } });
  const byWafer = <Row extends { wafer?: { id: string } | null }>(rows: readonly Row[], id: string) =>
    rows.filter(({ wafer }) => wafer?.id === id);
  return {
    wafers: wafers.map(({ id, name, slot, status }) => ({
      id,
      name,
      status,
      slot: slot ?? null,
      figures: newestFigures(
        byWafer(measurements, id).map((each) => ({ content: each.content, on: dayOf(each) })),
        byWafer(scans, id).flatMap(stressOf),
      ),
      scans: byWafer(scans, id).length,
      waiting: byWafer(waiting, id).length,
    })),
    tables: tablesOf(measurements as Loaded[]),
    maps: wafers.flatMap((wafer) => mapOf(wafer, byWafer(measurements as Loaded[], wafer.id))),
  };
}

type Loaded = WaferMeasurement & {
  reading: { id: string; file: { id: string; name: string } };
  createdBy: { name: string };
};

async function waitingOf(em: EntityManager, lot: string): Promise<string[]> {
  const rows = await em.execute<{ id: string }[]>(
    `select id from wafer_scan where wafer_id in (select id from wafer where lot_id = ?) and ${WAITING}`,
    [lot],
  );
  return rows.map(({ id }) => id);
}

/** The day that a file gives, or on which it came in, ISO. */
const dayOf = ({ measuredAt, createdAt }: { measuredAt?: Date | null; createdAt: Date }) =>
  (measuredAt ?? createdAt).toISOString().slice(0, 10);

/** A wafer that has rolled gives no stress. */
function stressOf(scan: Scan): DatedStress[] {
  if (scan.curled) return [];
  const { stress, stressUncertainty, azimuth } = scan;
  const line = azimuth === null || azimuth === undefined ? "" : ` along ${azimuthText(azimuth)}`;
  return [{ stress, stressUncertainty, on: scan.createdAt.toISOString().slice(0, 10), how: `from scans${line}` }];
}

function tablesOf(measurements: readonly Loaded[]): LotTable[] {
  const tables = new Map<string, LotTable>();
  for (const { reading, kind, createdAt, createdBy } of measurements) {
    const known = tables.get(reading.id);
    if (known) known.wafers += 1;
    else
      tables.set(reading.id, {
        reading: reading.id,
        file: { id: reading.file.id, name: reading.file.name },
        kind,
        wafers: 1,
        createdAt: createdAt.toISOString(),
        createdBy: createdBy.name,
      });
  }
  return [...tables.values()];
}

function mapOf({ id, name, slot }: Wafer, measurements: readonly Loaded[]): WaferMap[] {
  for (const measurement of measurements) {
    const { content, reading } = measurement;
    if (content.kind !== "thickness map") continue;
    const sites = content.sites.map(({ x, y, thickness }) => ({ x, y, thickness }));
    const { underneath } = content;
    const wafer = { id, name, slot: slot ?? null };
    return [{ wafer, sites, underneath: underneath ?? null, file: reading.file.name, on: dayOf(measurement) }];
  }
  return [];
}
