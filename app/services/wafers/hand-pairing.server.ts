import { LockMode, UniqueConstraintViolationException, type EntityManager } from "@mikro-orm/postgresql";
import { WaferScan } from "#app/db/entities/wafer-scan.ts";
import { lineLabel } from "#app/lib/wafer-label.ts";
import type { WaferPlace } from "#app/schemas/wafer-place.ts";
import type { HandPair } from "#app/schemas/waiting.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { referencedBy } from "../referenced.server.ts";
import { pairRefusal } from "../scan-pair.ts";
import { idFrom } from "../uuid.server.ts";
import { findOrMakeWafer } from "./find-wafer.server.ts";
import { ImportRefused } from "./import-refused.ts";
import { makeScan } from "./make-scan.server.ts";
import { tidyWafers } from "./tidy-wafer.server.ts";
import { labelled } from "./wafer-of.ts";
import { waitingPartner } from "./waiting-partner.server.ts";

export type HandPaired =
  { outcome: "scan"; scan: string } | { outcome: "refused"; field: string | null; reason: string };

/**
 * Makes a scan of two files that wait, chosen by a person. The partner is taken onto the wafer and line of the first.
 * @throws 404 for a file that is not there, of another program, or that has its partner by now; 403 for a role that may not
 */
export async function pairByHand(
  scope: ActorScope,
  waferScanId: string | undefined,
  { partner, ...subject }: HandPair,
): Promise<HandPaired> {
  const id = idFrom(waferScanId, "file that waits");
  return refusing(() =>
    inScope(scope, async (em) => {
      const otherId = idFrom(partner, "file that waits");
      // Always in one order, so that two people who choose each other's file do not wait for each other.
      const held = new Map<string, WaferScan>();
      for (const each of [id, otherId].toSorted()) held.set(each, await waitingOf(em, scope, each));
      const [own, other] = [held.get(id), held.get(otherId)];
      if (!own || !other) throw notFound("file that waits");
      if (other.program.id !== own.program.id) throw notFound("file that waits");
      if (other.side === own.side)
        throw new ImportRefused(`Both files are ${own.side} the film. Choose one of the other side.`, "partner");
      const left = other.wafer.id;
      Object.assign(own, { subject });
      Object.assign(other, { wafer: own.wafer, azimuth: own.azimuth, subject });
      await em.flush();
      const [before, after] = own.side === "before" ? [own, other] : [other, own];
      const scan = await makeScan(em, scope, { before, after, newest: own });
      await tidyWafers(em, [left]);
      return { outcome: "scan", scan: scan.id };
    }),
  );
}

export type Moved = HandPaired | { outcome: "moved"; label: string; side: WaferPlace["side"] };

/**
 * Says anew where a file that waits belongs. Where its partner waits there, the scan is made.
 * @throws 404 for a file that is not there, of another program, or that has its partner by now; 403 for a role that may not
 */
export async function moveWaiting(
  scope: ActorScope,
  waferScanId: string | undefined,
  { azimuth, side, ...named }: WaferPlace,
): Promise<Moved> {
  const id = idFrom(waferScanId, "file that waits");
  return refusing(() =>
    inScope(scope, async (em): Promise<Moved> => {
      const placed = await waitingOf(em, scope, id);
      const left = placed.wafer.id;
      const wafer = await findOrMakeWafer(em, scope, placed.program.id, named);
      Object.assign(placed, { wafer, azimuth, side });
      await em.flush();
      if (wafer.id !== left) await tidyWafers(em, [left]);
      const partner = await waitingPartner(em, placed);
      if (!partner) return { outcome: "moved", label: lineLabel(labelled(wafer), azimuth), side };
      const [before, after] = side === "before" ? [placed, partner] : [partner, placed];
      const scan = await makeScan(em, scope, { before, after, newest: placed });
      return { outcome: "scan", scan: scan.id };
    }),
  );
}

/** A placed scan that still waits, held until the transaction ends. */
async function waitingOf(em: EntityManager, scope: ActorScope, id: string): Promise<WaferScan> {
  const placed = await em.findOne(WaferScan, { id }, { lockMode: LockMode.PESSIMISTIC_WRITE });
  if (!placed) throw notFound("file that waits");
  requireInProgram(scope, "upload scans", placed.program.id, "file that waits");
  if ((await referencedBy(em, "wafer_scan", id)).length > 0) throw notFound("file that waits");
  return placed;
}

/** What cannot be paired or moved changes nothing, and is said. */
async function refusing<Done>(work: () => Promise<Done>): Promise<Done | Extract<HandPaired, { outcome: "refused" }>> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException)
      return { outcome: "refused", field: null, reason: "The same file lies there already. Remove this one instead." };
    const reason = error instanceof ImportRefused ? error.message : pairRefusal(error);
    if (reason === null) throw error;
    return { outcome: "refused", field: error instanceof ImportRefused ? error.field : null, reason };
  }
}
