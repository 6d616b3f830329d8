import type { EntityManager } from "@mikro-orm/postgresql";
import { WaferScan } from "#app/db/entities/wafer-scan.ts";
import { pairScans } from "#app/engine/profile/orient-scan.ts";

/** Placed scans that no scan uses: they wait for their partner. */
export const WAITING =
  "not exists (select 1 from scan where scan.before_scan_id = wafer_scan.id or scan.after_scan_id = wafer_scan.id)";

/** The placed scans of some programs that wait, by their ids. */
export async function waitingIds(em: EntityManager, programs: readonly string[]): Promise<string[]> {
  if (programs.length === 0) return [];
  const rows = await em.execute<{ id: string }[]>(
    `select id from wafer_scan where program_id in (${programs.map(() => "?").join(", ")}) and ${WAITING}`,
    [...programs],
  );
  return rows.map(({ id }) => id);
}

/**
 * The scan of the other side that waits on the same line of the same wafer, the newest of several; null when there is none. A file is
 * never its own partner.
 */
export async function waitingPartner(em: EntityManager, scan: WaferScan): Promise<WaferScan | null> {
  const rows = await em.execute<{ id: string }[]>(
    `select id from wafer_scan where wafer_id = ? and side <> ? and ${WAITING}
       and (select file_id from scan_reading where id = reading_id) <> (select file_id from scan_reading where id = ?)`,
    [scan.wafer.id, scan.side, scan.reading.id],
  );
  const waiting = await em.find(
    WaferScan,
    { id: { $in: rows.map(({ id }) => id) } },
    { orderBy: [{ createdAt: "desc" }, { id: "asc" }] },
  );
  const place = (each: WaferScan) => ({ wafer: each.wafer.id, azimuth: each.azimuth, scan: each });
  const { pairs } = pairScans([place(scan)], waiting.map(place));
  return pairs[0]?.post.scan ?? null;
}
