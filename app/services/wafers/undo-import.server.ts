import { ForeignKeyConstraintViolationException } from "@mikro-orm/core";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Scan } from "#app/db/entities/scan.ts";
import { WaferMeasurement } from "#app/db/entities/wafer-measurement.ts";
import { WaferScan } from "#app/db/entities/wafer-scan.ts";
import { count } from "#app/lib/count-words.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { referencedBy } from "../referenced.server.ts";
import { idFrom } from "../uuid.server.ts";
import { tidyWafers } from "./tidy-wafer.server.ts";

/** What was undone, or why not, in a sentence. */
export type Undone = { outcome: "undone"; sentence: string } | { outcome: "used"; sentence: string };

/** What holds on to a scan, by the table's name. */
const USES: Record<string, string> = { film_stress_value: "its stress stands in the history of its film" };

/** By what a scan is used, in words; null when it may be undone. */
export async function useOfScan(em: EntityManager, id: string): Promise<string | null> {
  const tables = await referencedBy(em, "scan", id);
  return tables.length === 0 ? null : tables.map(wordsOf).join(", and ");
}

const wordsOf = (table: string) => USES[table] ?? `a ${table.replaceAll("_", " ")} rests on it`;

/**
 * Undoes a scan that nothing uses. Its two files stay as they came; where they were placed on a wafer they wait for a partner again, or
 * leave it with the scan.
 * @throws 404 for a scan that is not there or of another program, 403 for a role that may not
 */
export async function undoScan(
  scope: ActorScope,
  scanId: string | undefined,
  placed: "wait again" | "leave",
): Promise<Undone> {
  const id = idFrom(scanId, "scan");
  return undoing(() =>
    inScope(scope, async (em): Promise<Undone> => {
      const scan = await em.findOne(Scan, { id }, { populate: ["wafer", "beforeScan", "afterScan"] });
      if (!scan) throw notFound("scan");
      requireInProgram(scope, "upload scans", scan.program.id, "scan");
      const use = await useOfScan(em, id);
      if (use !== null) return usedAnswer(use);
      const { wafer, beforeScan, afterScan } = scan;
      em.remove(scan);
      await em.flush();
      const halves = [beforeScan, afterScan].filter((half) => half !== null && half !== undefined);
      if (placed === "wait again" && halves.length > 0)
        return undone("The scan is undone. Its two files wait for a partner again.");
      for (const half of halves) await leave(em, half);
      if (wafer) await tidyWafers(em, [wafer.id]);
      return undone("The import is undone. The two files themselves are kept.");
    }),
  );
}

/** A placed scan goes unless another scan still uses it, such as the next film's. */
async function leave(em: EntityManager, half: WaferScan): Promise<void> {
  if ((await referencedBy(em, "wafer_scan", half.id)).length > 0) return;
  em.remove(half);
  await em.flush();
}

/**
 * Takes a file that waits for its partner out of the queue; the file itself stays.
 * @throws 404 for one that is not there or of another program, 403 for a role that may not
 */
export async function removeWaiting(scope: ActorScope, waferScanId: string | undefined): Promise<Undone> {
  const id = idFrom(waferScanId, "file that waits");
  return undoing(() =>
    inScope(scope, async (em): Promise<Undone> => {
      const placed = await em.findOne(WaferScan, { id });
      if (!placed) throw notFound("file that waits");
      requireInProgram(scope, "upload scans", placed.program.id, "file that waits");
      if ((await referencedBy(em, "wafer_scan", id)).length > 0)
        return { outcome: "used", sentence: "This file has its partner by now. Undo the scan that they make first." };
      const wafer = placed.wafer.id;
      em.remove(placed);
      await em.flush();
      await tidyWafers(em, [wafer]);
      return undone("The import is undone. The file itself is kept.");
    }),
  );
}

/**
 * Takes away what a table said of wafers; the file itself stays.
 * @throws 404 for a table that is not there or of another program, 403 for a role that may not
 */
export async function undoTable(scope: ActorScope, readingId: string | undefined): Promise<Undone> {
  const id = idFrom(readingId, "table");
  return undoing(() =>
    inScope(scope, async (em): Promise<Undone> => {
      const rows = await em.find(WaferMeasurement, { reading: id }, { fields: ["program", "wafer"] });
      const [first] = rows;
      if (!first) throw notFound("table");
      requireInProgram(scope, "upload scans", first.program.id, "table");
      const wafers = rows.map(({ wafer }) => wafer.id);
      for (const row of rows) em.remove(row);
      await em.flush();
      await tidyWafers(em, wafers);
      const what = wafers.length === 1 ? "one wafer" : `${count(wafers.length)} wafers`;
      return undone(`The import is undone: what the table said of ${what} is gone. The file itself is kept.`);
    }),
  );
}

const undone = (sentence: string): Undone => ({ outcome: "undone", sentence });
const usedAnswer = (use: string): Undone => ({
  outcome: "used",
  sentence: `This scan is used: ${use}. Take it out there first.`,
});

/** Somebody used it between our look and our hand: the database refuses, and so do we. */
async function undoing(work: () => Promise<Undone>): Promise<Undone> {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof ForeignKeyConstraintViolationException)) throw error;
    return { outcome: "used", sentence: "This has been used a moment ago. Open the page again to see by what." };
  }
}
